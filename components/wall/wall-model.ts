import type { Judge } from '@/components/lesson/judge'
import type { LessonView } from '@/components/lesson/lesson-view'
import { countFindings, markRoom, rankRoom, type RoomFinding, type RoomGroup } from '@/components/lesson/room'
import { roomRubric, rubricOf, setAsideRubrics, type Rubric } from '@/components/lesson/rubrics'
import { roomScoreOf } from '@/components/lesson/score-of'
import type { Words } from '@/components/words'
import { groupProposals, type ChorusState } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { ScoreInput } from '@/shared/notation/score-input'

/** How much the margin holds: lines of type, and letters in each. */
export type MarginRoom = Readonly<{ lines: number; letters: number }>

export type WallReading = Readonly<{
  score: ScoreInput
  /** As many as the margin holds, the weightiest first. */
  rubrics: readonly Rubric[]
  /** How many more there would be to say. */
  untold: number
  /** How many have offered anything in the released bars. */
  offered: number
  groups: readonly RoomGroup[]
}>

/** A remark is told to the room when it is true of a quarter of those who offered anything, and of more than two. */
const SHARE = 0.25
const FEW = 2

/** A rubric with the findings it speaks of, so that an arc is drawn for what is told and for nothing else. */
type Telling = Readonly<{ rubric: Rubric; of: 'room' | 'line'; findings: readonly Finding[] }>

const isLaw = ({ level }: Finding): boolean => level === 'law'

function ofRoom(found: RoomFinding, words: Words): readonly Telling[] {
  const rubric = roomRubric(found, words)
  return rubric
    ? [
        {
          rubric: rubric.tone === 'breach' ? rubric : { ...rubric, mend: null },
          of: 'room' as const,
          findings: found.findings,
        },
      ]
    : []
}

function ofLine(finding: Finding, words: Words): Telling {
  const rubric = rubricOf(finding, words)
  return {
    rubric: rubric.tone === 'breach' ? rubric : { ...rubric, mend: null },
    of: 'line',
    findings: [finding],
  }
}

/** Lines a rubric takes: its heading, and its words broken at the margin's width. */
export const rubricLines = ({ sentence, mend }: Rubric, letters: number): number =>
  1 + Math.ceil((sentence.length + (mend ? mend.length + 1 : 0)) / letters)

/** The first rubrics that fit whole; one is always told. */
export function fitRubrics<Told extends Readonly<{ rubric: Rubric }>>(
  told: readonly Told[],
  { lines, letters }: MarginRoom,
): readonly Told[] {
  const fitting: Told[] = []
  let left = lines
  for (const each of told) {
    // Half a line stands between two.
    const taken = rubricLines(each.rubric, letters) + (fitting.length > 0 ? 0.75 : 0)
    if (taken > left && fitting.length > 0) continue
    left -= taken
    fitting.push(each)
  }
  return fitting
}

/** What the wall shows: notes and findings of the room only where the teacher lets them be seen. */
export function readWall(
  view: LessonView,
  chorus: ChorusState,
  judge: Judge,
  words: Words,
  room: MarginRoom,
): WallReading {
  const groups = rankRoom(groupProposals(chorus, view.released, view.bars), judge)
  const offered = groups.reduce((sum, { count }) => sum + count, 0)
  const { showsSpread, showsFindings } = view.stage
  const isTold = showsSpread && showsFindings
  const found = isTold ? countFindings(groups) : []
  const least = Math.max(FEW + 1, offered * SHARE)
  const line = showsFindings ? judge.ofLine() : []
  const tellings: readonly Telling[] = [
    ...found.filter(({ findings }) => findings.some(isLaw)).flatMap((each) => ofRoom(each, words)),
    ...line.filter(isLaw).map((finding) => ofLine(finding, words)),
    ...found
      .filter(({ findings, count }) => !findings.some(isLaw) && count >= least)
      .flatMap((each) => ofRoom(each, words)),
    ...line.filter((finding) => !isLaw(finding)).map((finding) => ofLine(finding, words)),
    ...setAsideRubrics(view, words).map((rubric) => ({ rubric, of: 'line' as const, findings: [] })),
  ]
  const told = fitRubrics(tellings, room)
  const marks = showsSpread ? markRoom(groups) : []
  return {
    score: roomScoreOf(
      view,
      isTold ? marks : marks.map((mark) => ({ ...mark, tone: 'line' as const })),
      line,
      {
        ofRoom: told.flatMap(({ of, findings }) => (of === 'room' ? findings : [])),
        ofLine: told.flatMap(({ of, findings }) => (of === 'line' ? findings : [])),
      },
    ),
    rubrics: told.map(({ rubric }) => rubric),
    untold: tellings.length - told.length,
    offered,
    groups,
  }
}

/** Size of the prompt, in px of a wall 1920 wide: a short one may be read from the last row, a long one must fit. */
export function promptSizePx(prompt: string): number {
  if (prompt.length <= 84) return 56
  return prompt.length <= 150 ? 42 : 32
}

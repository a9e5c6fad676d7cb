import type { Judge } from '@/components/lesson/judge'
import type { LessonView } from '@/components/lesson/lesson-view'
import { countFindings, markRoom, rankRoom, type RoomGroup } from '@/components/lesson/room'
import { roomRubrics, rubricsOf, setAsideRubrics, type Rubric } from '@/components/lesson/rubrics'
import { roomScoreOf } from '@/components/lesson/score-of'
import type { Words } from '@/components/words'
import { groupProposals, type ChorusState } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { ScoreInput } from '@/shared/notation/score-input'

export type WallReading = Readonly<{
  score: ScoreInput
  /** The room's first, then the line's, then what is set aside. */
  rubrics: readonly Rubric[]
  /** How many have offered anything in the released bars. */
  offered: number
  groups: readonly RoomGroup[]
}>

/** A remark that one or two share belongs to them; the wall speaks of what many do. Every breach is told. */
const FEW = 2

const NONE: readonly Finding[] = []

/** What the wall shows: notes and findings of the room only where the teacher lets them be seen. */
export function readWall(view: LessonView, chorus: ChorusState, judge: Judge, words: Words): WallReading {
  const groups = rankRoom(groupProposals(chorus, view.released, view.bars), judge)
  const { showsSpread, showsFindings } = view.stage
  const isTold = showsSpread && showsFindings
  const found = isTold
    ? countFindings(groups).filter(({ finding, count }) => finding.level === 'law' || count > FEW)
    : []
  const marks = showsSpread ? markRoom(groups) : []
  const ofLine = showsFindings ? judge.ofLine() : NONE
  return {
    score: roomScoreOf(view, isTold ? marks : marks.map((mark) => ({ ...mark, tone: 'line' as const })), [
      ...found.map(({ finding }) => finding),
      ...ofLine,
    ]),
    rubrics: [...roomRubrics(found, words), ...rubricsOf(ofLine, words), ...setAsideRubrics(view, words)],
    offered: groups.reduce((sum, { count }) => sum + count, 0),
    groups,
  }
}

/** Size of the prompt, in px of a wall 1920 wide: a short one may be read from the last row, a long one must fit. */
export function promptSizePx(prompt: string): number {
  if (prompt.length <= 84) return 56
  return prompt.length <= 150 ? 42 : 32
}

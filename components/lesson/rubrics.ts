import type { Words } from '@/components/words'
import { describeFinding, type Finding, type RuleId } from '@/shared/rules'
import { runsOf } from './bars'
import type { LessonView } from './lesson-view'
import type { RoomFinding } from './room'

/** A finding in words, as it stands in the margin. */
export type Rubric = Readonly<{
  id: string
  /** The rule that speaks, for whoever asks why; null where no rule does. */
  ruleId: RuleId | null
  tone: 'breach' | 'remark' | 'quiet'
  bars: readonly number[]
  /** `Bars 6–7` */
  heading: string
  sentence: string
  /** What would mend it, where the rule can say. */
  mend: string | null
}>

const toneOf = (level: Finding['level']): Rubric['tone'] => (level === 'law' ? 'breach' : 'remark')

const breachesFirst = (a: Rubric, b: Rubric): number =>
  Number(b.tone === 'breach') - Number(a.tone === 'breach') || (a.bars[0] ?? 0) - (b.bars[0] ?? 0)

const idOf = ({ ruleId, code, voice, bars, args }: Finding): string =>
  `${ruleId}/${code}/${voice}/${bars.join(',')}/${JSON.stringify(args)}`

/** The bars of several findings, each once, ascending. */
const barsOfAll = (findings: readonly Finding[]): readonly number[] =>
  [...new Set(findings.flatMap(({ bars }) => bars))].sort((a, b) => a - b)

export function rubricOf(finding: Finding, words: Words): Rubric {
  const { sentence, mend } = describeFinding(finding)
  return {
    id: idOf(finding),
    ruleId: finding.ruleId,
    tone: toneOf(finding.level),
    bars: finding.bars,
    heading: words.lesson.barsHeading(finding.bars),
    sentence,
    mend: mend || null,
  }
}

/** Findings as they stand in a margin: breaches first, then in the order of the bars. */
export const rubricsOf = (findings: readonly Finding[], words: Words): readonly Rubric[] =>
  findings.map((finding) => rubricOf(finding, words)).sort(breachesFirst)

/** What is true of the room's own proposals, with how many it is true of: "Nine of you: both voices rise into a fifth." */
export function roomRubric({ id, findings, count }: RoomFinding, words: Words): Rubric | null {
  const [first] = findings
  if (!first) return null
  const rubric = rubricOf(first, words)
  const bars = barsOfAll(findings)
  return {
    ...rubric,
    id: `room/${id}`,
    bars,
    heading: words.lesson.barsHeading(bars),
    sentence: words.lesson.ofYou(count, rubric.sentence),
  }
}

/** That bars are set aside, one rubric for each run of them. */
export const setAsideRubrics = (view: LessonView, words: Words): readonly Rubric[] =>
  runsOf([...view.setAside].sort((a, b) => a - b)).map((bars) => ({
    id: `set-aside/${bars.join(',')}`,
    ruleId: null,
    tone: 'quiet',
    bars,
    heading: words.lesson.barsHeading(bars),
    sentence: words.lesson.setAsideRubric(bars.length),
    mend: null,
  }))

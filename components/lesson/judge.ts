import type { Exercise, Finding, RuleSet } from '@/shared/rules'
import { checkLine } from '@/shared/rules'
import type { Line } from '@/shared/theory/note'
import { barsOf, identityOfLine, lineWith, lineWithout } from './line-with'

/** What the checker is asked about: the exercise, the class's line and the bars not read. */
export type JudgedScore = Readonly<{
  exercise: Exercise
  ruleSet: RuleSet
  line: Line
  setAside: ReadonlySet<number>
}>

export type Judge = Readonly<{
  /** Findings of the class's line as it stands. */
  ofLine: () => readonly Finding[]
  /**
   * Findings that some notes, laid over the class's line, bring with them: those the line does not have without these bars.
   * Answers are kept by identity, so that five hundred alike cost one.
   */
  ofNotes: (notes: Line) => readonly Finding[]
}>

const identityOfFinding = ({ ruleId, code, voice, bars, args }: Finding): string =>
  `${ruleId}/${code}/${voice}/${bars.join(',')}/${JSON.stringify(args)}`

/** Asks the checker about one state of the score, each question once. Make a new one when the score changes. */
export function createJudge({ exercise, ruleSet, line, setAside }: JudgedScore): Judge {
  const check = (judged: Line): readonly Finding[] => checkLine(exercise, judged, ruleSet, { setAside })
  const answers = new Map<string, readonly Finding[]>()
  const known = new Map<string, ReadonlySet<string>>()
  let ofLine: readonly Finding[] | null = null

  /** What is already said of the line when these bars are unwritten. */
  const without = (bars: readonly number[]): ReadonlySet<string> => {
    const key = bars.join(',')
    const before = known.get(key)
    if (before) return before
    const found = new Set(check(lineWithout(line, bars)).map(identityOfFinding))
    known.set(key, found)
    return found
  }

  return {
    ofLine: () => (ofLine ??= check(line)),
    ofNotes: (notes) => {
      const key = identityOfLine(notes)
      const before = answers.get(key)
      if (before) return before
      const bars = barsOf(notes)
      const already = without(bars)
      const brought = check(lineWith(line, notes)).filter(
        (finding) => !already.has(identityOfFinding(finding)),
      )
      answers.set(key, brought)
      return brought
    },
  }
}

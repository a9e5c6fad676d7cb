import type { Checker, Finding } from '@/shared/rules'
import type { Line } from '@/shared/theory/note'
import { identityOfLine } from './line-with'

export type Judge = Readonly<{
  /** Findings of the class's line as it stands. */
  ofLine: () => readonly Finding[]
  /** Findings on some notes laid over the class's line: those that point at a bar of theirs. */
  ofNotes: (notes: Line) => readonly Finding[]
  /** Findings on many, in one pass over the line: whatever is then asked of one of them is known. */
  ofAll: (many: Iterable<Line>) => void
}>

/**
 * Asks the checker about one state of the score, each question once: answers are kept by what is written, so that five
 * hundred proposals alike cost one. Make a new judge when the line or the bars set aside change.
 */
export function createJudge(checker: Checker, line: Line, setAside: ReadonlySet<number>): Judge {
  const answers = new Map<string, readonly Finding[]>()
  let ofLine: readonly Finding[] | null = null

  const ofAll = (many: Iterable<Line>): void => {
    const unknown = new Map<string, Line>()
    for (const notes of many) {
      const key = identityOfLine(notes)
      if (!answers.has(key)) unknown.set(key, notes)
    }
    if (unknown.size === 0) return
    const found = checker.annotate(line, [...unknown.values()], setAside)
    let index = 0
    for (const key of unknown.keys()) answers.set(key, found[index++] ?? [])
  }

  return {
    ofLine: () => (ofLine ??= checker.checkLine(line, setAside)),
    ofAll,
    ofNotes: (notes) => {
      ofAll([notes])
      return answers.get(identityOfLine(notes)) ?? []
    },
  }
}

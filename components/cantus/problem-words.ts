import type { Words } from '@/components/words'
import type { Clef } from '@/shared/theory/clef'
import { pitchOf } from '@/shared/theory/pitch'
import { MAX_BARS, MIN_BARS } from '@/shared/wire/documents'
import type { JudgedDraft } from './judge-draft'

/** What is wrong with the notes, in words, each problem a sentence. Notes outside the mode are no fault of form. */
export function notesProblems(judged: JudgedDraft, clef: Clef, words: Words): readonly string[] {
  const say = words.cantus.problems
  const bad = judged.tokens.flatMap(({ text, pitch }, index) => (pitch ? [] : [{ text, bar: index + 1 }]))
  if (bad.length > 0) {
    return [
      say.notNotes(
        bad.map(({ text }) => text),
        bad.map(({ bar }) => bar),
      ),
    ]
  }
  return judged.problems.flatMap(({ code, bars }) => {
    switch (code) {
      case 'too-short':
        return [say['too-short'](MIN_BARS)]
      case 'too-long':
        return [say['too-long'](MAX_BARS)]
      case 'out-of-clef-range':
        return [say['out-of-clef-range'](bars, words.lesson.clef[clef])]
      case 'wrong-final':
      case 'not-diatonic':
        return []
    }
  })
}

/** What is wrong with the final, or with mode and final together. */
export function finalProblem(judged: JudgedDraft, words: Words): string | null {
  const say = words.cantus.problems
  if (judged.signature === null) return say.noSignature
  const last = judged.tokens.at(-1)?.pitch
  if (!last || !judged.problems.some(({ code }) => code === 'wrong-final')) return null
  return say['wrong-final'](words.lesson.pitchPrinted(pitchOf(last)), words.lesson.pitchPrinted(judged.final))
}

import type { CantusBody } from '@/shared/api/cantus'
import type { FieldProblem } from '@/shared/api/errors'
import { isComfortable } from '@/shared/theory/clef'
import { formatPitchClass, pitchOf } from '@/shared/theory/pitch'

/**
 * What keeps notes from being a cantus at all, whatever the rule set: it ends on its final, and its clef carries every
 * note. Taste and law are the rule set's, and are told while one writes.
 */
export function cantusProblems({ notes, final, clef }: CantusBody): readonly FieldProblem[] {
  const pitches = notes.map(pitchOf)
  const last = pitches.at(-1)
  const outside = pitches.flatMap((pitch, index): readonly FieldProblem[] =>
    isComfortable(pitch, clef)
      ? []
      : [{ path: `notes.${index}`, code: 'out-of-clef-range', args: { bar: index + 1 } }],
  )
  if (last && formatPitchClass(last) === final) return outside
  const wrongFinal = {
    path: 'final',
    code: 'wrong-final',
    args: { final, last: last ? formatPitchClass(last) : '' },
  }
  return [...outside, wrongFinal]
}

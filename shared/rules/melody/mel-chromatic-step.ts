import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldPairs, spanArgs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({})
type Params = z.infer<typeof params>

export const melChromaticStep: Rule<OneBehind, Params> = {
  id: 'mel-chromatic-step',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldPairs<Params>((before, now, _params, { voice }) =>
    stepsFrom(before.note, now.note) === 0 && before.note.alteration !== now.note.alteration
      ? breachAt(voice, 'chromatic', [before, now], spanArgs(before, now))
      : null,
  ),
  explain: {
    title: 'No chromatic step',
    statement: 'One voice does not move from a note to its own altered form, such as C to C sharp.',
    why: 'The modes know only one note on each letter at a time; the half step between two forms of it belongs to a later style.',
    mends: 'Put another note between, or approach the altered note from its neighbour.',
    sources: [{ source: 'GENN' }, { source: 'LEHM', place: 'lesson I' }, { source: 'MANNF' }],
    right: {
      cantus: 'F4 E4 D4',
      line: 'D5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'A4 F4 E4 D4',
      line: 'A4 C5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
    },
    messages: { chromatic: 'From {from} to {to} is a chromatic half step.' },
  },
}

import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldNotes, type Frame } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'
import { isDiatonic } from '@/shared/theory/scale'

const params = z.strictObject({})
type Params = z.infer<typeof params>

export const cfDiatonic: Rule<Frame, Params> = {
  id: 'cf-diatonic',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  ...foldNotes<Params>((now, _params, { exercise: { mode, final }, voice }) =>
    isDiatonic(now.note, mode, final)
      ? null
      : breachAt(voice, 'foreign', [now], { note: formatPitch(now.note) }),
  ),
  explain: {
    title: 'A cantus without accidentals',
    statement: 'The cantus carries no accidentals: it keeps to the notes of its mode.',
    why: 'The cantus is what makes the mode known. Accidentals belong to the added voice, and there to the close.',
    mends: 'Take the note of the mode on the same letter, or another note.',
    sources: [
      { source: 'CFH', place: 'rule 3' },
      { source: 'EX', place: 'Fux’s canti firmi' },
    ],
    right: { cantus: 'D4 F4 E4 C4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 C#4 D4', mode: 'dorian', final: 'D', breaches: [4] },
    messages: { foreign: '{note} does not belong to the mode; a cantus carries no accidentals.' },
  },
}

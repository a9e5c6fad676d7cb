import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldPairs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'

const params = z.strictObject({})
type Params = z.infer<typeof params>

export const melNoRepeatCf: Rule<OneBehind, Params> = {
  id: 'mel-no-repeat-cf',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  ...foldPairs<Params>((before, now, _params, { voice }) =>
    isSamePitch(before.note, now.note)
      ? breachAt(voice, 'repeated', [before, now], { note: formatPitch(now.note) })
      : null,
  ),
  explain: {
    title: 'No repeated note in the cantus',
    statement: 'A note of the cantus is not struck twice in a row.',
    why: 'In equal notes a repetition is a standstill; the line should always be on its way.',
    mends: 'Replace one of the two with a neighbour, or leave it out.',
    sources: [
      { source: 'CFH', place: 'rule 7' },
      { source: 'EX', place: 'Fux’s canti firmi' },
    ],
    right: { cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: { repeated: '{note} is struck twice in a row; a cantus does not stand still.' },
  },
}

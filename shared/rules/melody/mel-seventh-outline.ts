import { z } from 'zod'
import { ALL_SPECIES, breachAt, spanArgs } from '@/shared/rules/fold'
import { foldTurningPoints, type Outline } from '@/shared/rules/melody/turning-points'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({})
type Params = z.infer<typeof params>

export const melSeventhOutline: Rule<Outline, Params> = {
  id: 'mel-seventh-outline',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldTurningPoints<Params>((from, to, _params, voice) => {
    const size = Math.abs(stepsFrom(from.note, to.note))
    return size === 6 || size === 8 ? breachAt(voice, 'outlined', [from, to], spanArgs(from, to)) : null
  }),
  explain: {
    title: 'No seventh between turning points',
    statement: 'Motion in one direction is not bounded by a seventh or a ninth.',
    why: 'The ear measures the line from turn to turn, and a seventh or ninth there sounds as rough as a leap of one.',
    mends: 'Carry the motion on to the octave, or turn a note earlier.',
    sources: [{ source: 'OMT1', place: 'second and third species' }, { source: 'HSR' }],
    right: { cantus: 'D4 E4 F4 A4 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 F4 A4 C5 B4 A4 B4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [5] },
    messages: { outlined: 'Going one way, the line runs from {from} to {to}, a {interval}.' },
  },
}

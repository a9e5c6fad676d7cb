import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldTriples, type TwoBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { formatPitch } from '@/shared/theory/pitch'

const params = z.strictObject({})
type Params = z.infer<typeof params>

export const melLeapOrder: Rule<TwoBehind, Params> = {
  id: 'mel-leap-order',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldTriples<Params>((first, before, now, _params, { voice }) => {
    const one = stepsFrom(first.note, before.note)
    const two = stepsFrom(before.note, now.note)
    if (Math.sign(one) !== Math.sign(two) || one === 0) return null
    // Rising 1 then 3, or falling 3 then 1: in both the second move is the higher of two signed numbers.
    if (two <= one) return null
    return breachAt(voice, two > 0 ? 'rising' : 'falling', [first, before, now], {
      first: formatPitch(first.note),
      second: formatPitch(before.note),
      third: formatPitch(now.note),
    })
  }),
  explain: {
    title: 'Wide below, narrow above',
    statement: 'Going up, the wider interval comes first; going down, the narrower comes first.',
    why: 'Wide intervals low and narrow ones high follow the way a voice gathers and spends its strength.',
    mends: 'Exchange the two intervals, or turn the line after the first.',
    sources: [
      { source: 'E2', place: 'section 1-4' },
      { source: 'JEPP', fromMemory: true },
    ],
    right: { cantus: 'D4 A4 B4 A4 G4 E4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      rising: 'Rising {first}, {second}, {third}, the wider interval should come first.',
      falling: 'Falling {first}, {second}, {third}, the narrower interval should come first.',
    },
    disagreement: 'Found only in texts on the sixteenth century.',
  },
}

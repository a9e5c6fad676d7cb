import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldTriples, spanArgs, type TwoBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { directionFrom, semitonesFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  allowFifthThenThird: z
    .boolean()
    .default(true)
    .describe('Whether a rising fifth and a minor third on top of it may span a seventh.'),
})
type Params = z.infer<typeof params>

export const melTwoLeapSpan: Rule<TwoBehind, Params> = {
  id: 'mel-two-leap-span',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldTriples<Params>(
    (first, before, now, { allowFifthThenThird }, { voice }) => {
      const second = stepsFrom(before.note, now.note)
      if (Math.abs(second) < 2 || Math.abs(stepsFrom(first.note, before.note)) < 2) return null
      if (directionFrom(first.note, before.note) !== Math.sign(second)) return null
      const span = Math.abs(stepsFrom(first.note, now.note))
      const isFifthThenThird =
        semitonesFrom(first.note, before.note) === 7 &&
        second === 2 &&
        semitonesFrom(before.note, now.note) === 3
      if (span === 6 && !(allowFifthThenThird && isFifthThenThird)) {
        return breachAt(voice, 'seventh', [first, before, now], spanArgs(first, now))
      }
      return span > 7 ? breachAt(voice, 'beyond-octave', [first, before, now], spanArgs(first, now)) : null
    },
    (before, now) => Math.abs(stepsFrom(before.note, now.note)) >= 2,
  ),
  explain: {
    title: 'What two leaps span',
    statement: 'Two leaps in one direction do not together span a seventh, nor more than an octave.',
    why: 'The ear hears the outer notes of two leaps together; a seventh between them is as hard as a leap of a seventh.',
    mends: 'Make one leap smaller, or turn one of them round.',
    sources: [
      { source: 'HSR', place: 'hard rule 3' },
      { source: 'LEHM', place: 'lesson I' },
    ],
    right: { cantus: 'D4 A4 C5 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 G4 C5 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      seventh: 'Two leaps one way span a {interval}, {from} to {to}.',
      'beyond-octave': 'Two leaps one way span a {interval}, {from} to {to}, more than an octave.',
    },
    disagreement: 'One handout excuses a fifth with a minor third on top of it.',
  },
}

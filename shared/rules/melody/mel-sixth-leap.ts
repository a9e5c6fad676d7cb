import { z } from 'zod'
import { ALL_SPECIES, asRemark, breachAt, foldPairs, spanArgs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  minorDown: z.boolean().default(false).describe('Whether a minor sixth may fall. It may always rise.'),
  major: z
    .enum(['no', 'inside-bar-as-remark', 'inside-bar', 'yes'])
    .default('no')
    .describe('Major sixths: never; inside a bar, and there as a remark; inside a bar; anywhere.'),
})
type Params = z.infer<typeof params>

export const melSixthLeap: Rule<OneBehind, Params> = {
  id: 'mel-sixth-leap',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldPairs<Params>((before, now, { minorDown, major }, { voice }) => {
    const steps = stepsFrom(before.note, now.note)
    if (steps !== 5 && steps !== -5) return null
    const semitones = Math.abs(semitonesFrom(before.note, now.note))
    if (semitones === 8) {
      return steps > 0 || minorDown
        ? null
        : breachAt(voice, 'minor-down', [before, now], spanArgs(before, now))
    }
    if (semitones !== 9 || major === 'yes') return null
    const isInsideBar = before.bar === now.bar
    if (isInsideBar && major === 'inside-bar') return null
    const breach = breachAt(voice, 'major', [before, now], spanArgs(before, now))
    return isInsideBar && major === 'inside-bar-as-remark' ? asRemark(breach) : breach
  }),
  explain: {
    title: 'Sixths with care',
    statement:
      'A leap of a sixth is minor and goes up; major sixths and falling sixths are left out by most sources.',
    why: 'The sixth is the widest leap short of the octave and the hardest to sing in tune. Rising by a minor sixth it leans onto a half step that the ear expects.',
    mends: 'Leap a fifth or an octave instead, or split the sixth into a third and a fourth the other way.',
    sources: [
      { source: 'MANNF' },
      { source: 'HSR' },
      { source: 'E2' },
      { source: 'CCC' },
      { source: 'OMT1' },
      { source: 'BRIDGE' },
      { source: 'GROVE', place: 'second order' },
      { source: 'CHER', place: 'rule 15' },
      { source: 'EX' },
    ],
    right: { cantus: 'E4 C5 B4 A4 G4 F4 E4', mode: 'phrygian', final: 'E', breaches: [] },
    wrong: { cantus: 'D4 B4 A4 C5 E4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [2, 5] },
    messages: {
      'minor-down': 'A minor sixth falls from {from} to {to}; a leap of a sixth should rise.',
      major: 'From {from} to {to} is a major sixth, which is hard to sing in one leap.',
    },
    disagreement: 'Fux himself writes a falling minor sixth four times, and never a major sixth.',
  },
}

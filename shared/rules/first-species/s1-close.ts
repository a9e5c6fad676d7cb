import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { eachSonority } from '@/shared/rules/first-species/folds'
import { openingList, openingOf } from '@/shared/rules/first-species/opening'
import { breachAt, sizeOf } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { isFinal } from '@/shared/theory/scale'

const PARAMS = z.strictObject({
  set: openingList(['unison', 'octave'], 'Intervals to close with; fifteenths count as octaves.'),
  onFinal: z.boolean().default(true).describe('The last note of the line must be the final.'),
})
type Params = z.infer<typeof PARAMS>

export const s1Close: Rule<Exercise, Params> = {
  id: 's1-close',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  ...eachSonority<Params>((now, { exercise, params, moment }) => {
    if (!moment.isLast) return null
    const interval = openingOf(now)
    if (interval === null || !params.set.includes(interval)) {
      return breachAt('not-octave', [now], { interval: sizeOf(now) })
    }
    const isAway = params.onFinal && interval !== 'fifth' && !isFinal(now.note, exercise.final)
    return isAway ? breachAt('not-final', [now]) : null
  }),
  explain: {
    title: 'The close',
    statement: 'The last sonority is a unison or an octave on the final.',
    why: 'Only the most perfect consonance on the final is heard as an end.',
    mends: 'End on the final: with the cantus, or an octave from it.',
    sources: cite('OMT1', 'LEHM', 'CHER r1', 'NOTAV', 'RWU', 'FUXE', 'EX'),
    disagreement:
      'The English abridgement of Fux says any perfect concord, yet every example there ends on a unison or an octave.',
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 B4 A4', mode: 'dorian', final: 'D', breaches: [4] },
    messages: {
      'not-octave': 'The voices end a {interval} apart, not on a unison or an octave.',
      'not-final': 'The voices end together, but not on the final.',
    },
  },
}

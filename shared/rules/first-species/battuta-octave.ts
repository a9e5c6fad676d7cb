import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  isContrary,
  lowerOf,
  perfectKindOf,
  sizeOf,
  upperOf,
} from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const PARAMS = z.strictObject({
  scope: z
    .enum(['any-beat', 'accented'])
    .default('any-beat')
    .describe('Every arrival, or only one on the first beat of a bar.'),
  form: z
    .enum(['upper-leaps-down', 'converging'])
    .default('upper-leaps-down')
    .describe('The upper voice leaping down on a step of the lower; or any contrary motion that closes in.'),
  fifths: z.boolean().default(false).describe('Fifths are judged as well.'),
})
type Params = z.infer<typeof PARAMS>

export const battutaOctave: Rule<NeighbourState, Params> = {
  id: 'battuta-octave',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { exercise: { position }, params, moment }) => {
    const kind = perfectKindOf(now)
    if (kind === null || (kind === 'fifth' && !params.fifths) || !isContrary(before, now)) return null
    if (params.scope === 'accented' && moment.place !== 0) return null
    const upperSteps = stepsFrom(upperOf(before, position), upperOf(now, position))
    const lowerSteps = stepsFrom(lowerOf(before, position), lowerOf(now, position))
    const isBattuta =
      params.form === 'upper-leaps-down'
        ? upperSteps <= -2 && lowerSteps === 1
        : // Every good close from a tenth or a third closes in: the last bar is left alone.
          upperSteps < 0 && lowerSteps > 0 && !moment.isLast
    return isBattuta ? breachAt('leaps-onto', [before, now], { interval: sizeOf(now) }) : null
  }),
  explain: {
    title: 'The beaten octave',
    statement:
      'The upper voice does not leap down to an octave or unison while the lower voice steps up to it.',
    why: 'The two voices strike together like hands clapped, and the octave stands out as a stop in the middle of the music.',
    mends: 'Let the upper voice step, or go to a third or sixth here.',
    sources: cite('FUXE r2', 'GROVE 2nd order', 'PERF (on Salzer and Schachter)', 'EX'),
    disagreement:
      'A law in the English Fux and in Grove’s Dictionary; today’s open textbooks do not mention it.',
    right: { cantus: 'D3 C3 D3 E3 D3', line: 'D4 E4 D4 C#4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D3 C3 D3 E3 D3', line: 'D4 G4 D4 C#4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      'leaps-onto': 'The upper voice drops onto a {interval} as the lower voice comes up to meet it.',
    },
  },
}

import { z } from 'zod'
import {
  ALL_SPECIES,
  breachAt,
  goOn,
  isNoted,
  pack,
  packPitch,
  PITCH_ROOM,
  type Noted,
} from '@/shared/rules/fold'
import type { Rule, Voice } from '@/shared/rules/rule'
import { directionFrom, stepsFrom, type Direction } from '@/shared/theory/interval'

const params = z.strictObject({
  most: z.int().min(1).max(8).default(2).describe('Most leaps in a row.'),
  sameDirection: z.boolean().default(false).describe('Whether only leaps in one direction count together.'),
})
type Params = z.infer<typeof params>

/** The notes of the leaps in a row that has just sounded, the last note included; one note when it did not leap. */
type State = Readonly<{ voice: Voice; run: readonly Noted[]; direction: Direction }>

export const melLeapRun: Rule<State, Params> = {
  id: 'mel-leap-run',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, run: [], direction: 0 }),
  step: (state, moment, { most, sameDirection }) => {
    if (!isNoted(moment)) return goOn(moment.note === null ? { ...state, run: [], direction: 0 } : state)
    const { voice, run } = state
    const before = run.at(-1)
    if (before === undefined || Math.abs(stepsFrom(before.note, moment.note)) < 2) {
      return goOn({ voice, run: [moment], direction: 0 })
    }
    const direction = directionFrom(before.note, moment.note)
    const isBroken = sameDirection && state.direction !== 0 && direction !== state.direction
    const leaps = isBroken ? [before, moment] : [...run, moment]
    const isNew = leaps.length === most + 2
    const breach = isNew ? breachAt(voice, 'too-many', leaps, { count: most + 1, most }) : null
    // A run that has been reported is reported once: further leaps keep its length.
    return {
      state: {
        voice,
        run: leaps.length > most + 2 ? leaps.slice(1) : leaps,
        direction: sameDirection ? direction : 0,
      },
      breach,
    }
  },
  finish: () => null,
  key: ({ run, direction }) =>
    pack([packPitch(run.at(-1)?.note ?? null), PITCH_ROOM], [run.length, 16], [direction + 1, 3]),
  explain: {
    title: 'Few leaps in a row',
    statement: 'No more than two leaps follow one another.',
    why: 'Leap upon leap is heard as a broken chord, not as a line.',
    mends: 'Put a step between the leaps.',
    sources: [
      { source: 'OMT1' },
      { source: 'CFH', place: 'rule 6' },
      { source: 'ECR', place: 'rule 10' },
      { source: 'DAVD' },
      { source: 'HSR' },
      { source: 'BRIDGE', place: 'ch. 2, rule 10' },
      { source: 'EX' },
    ],
    right: { cantus: 'D4 F4 D4 E4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 D4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [4] },
    messages: { 'too-many': '{count} leaps in a row; no more than {most} should follow one another.' },
    disagreement: 'For some only leaps in one direction count.',
  },
}

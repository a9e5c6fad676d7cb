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
import { directionFrom, type Direction } from '@/shared/theory/interval'

const params = z.strictObject({
  most: z
    .int()
    .min(3)
    .max(16)
    .default(6)
    .describe(
      'Most notes in one direction, the first included. No published number; six is this catalogue’s proposal.',
    ),
})
type Params = z.infer<typeof params>

/** `count` notes have gone one way, no further counted than one more than allowed. */
type State = Readonly<{
  voice: Voice
  first: Noted | null
  before: Noted | null
  direction: Direction
  count: number
}>

export const melRunOneDirection: Rule<State, Params> = {
  id: 'mel-run-one-direction',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, first: null, before: null, direction: 0, count: 0 }),
  step: (state, moment, { most }) => {
    const { voice, first, before } = state
    if (!isNoted(moment)) {
      return goOn(
        moment.note === null ? { voice, first: null, before: null, direction: 0 as const, count: 0 } : state,
      )
    }
    if (before === null || first === null) {
      return goOn({ voice, first: moment, before: moment, direction: 0 as const, count: 1 })
    }
    const direction = directionFrom(before.note, moment.note)
    if (direction === 0) return goOn({ voice, first: moment, before: moment, direction, count: 1 })
    if (direction !== state.direction) {
      return goOn({ voice, first: before, before: moment, direction, count: 2 })
    }
    const count = Math.min(state.count + 1, most + 1)
    const isNew = count === most + 1 && state.count === most
    const breach = isNew
      ? breachAt(voice, direction > 0 ? 'rising' : 'falling', [first, moment], { count, most })
      : null
    return { state: { voice, first, before: moment, direction, count }, breach }
  },
  finish: () => null,
  key: ({ before, direction, count }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [direction + 1, 3], [count, 32]),
  explain: {
    title: 'Not too long one way',
    statement: 'A line does not go on and on in one direction.',
    why: 'Long motion one way is heard as a scale, and uses up the compass.',
    mends: 'Turn back for a note before going on.',
    sources: [{ source: 'CFH', place: 'rule 6, which says “excessive” and gives no number' }],
    right: { cantus: 'D4 A4 G4 F4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 C5 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [8] },
    messages: {
      rising: 'The line rises for {count} notes; turn back before more than {most}.',
      falling: 'The line falls for {count} notes; turn back before more than {most}.',
    },
  },
}

import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { STRUCK_SPECIES } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  isContrary,
  sharedDirection,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  minContraryPercent: z
    .int()
    .min(0)
    .max(100)
    .default(30)
    .describe('Share of all moves that should be contrary. No source gives a number.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{
  before: Sonority | null
  contrary: number
  moves: number
  together: readonly Sonority[]
}>

export const motionContrary: Rule<State, Params> = {
  id: 'motion-contrary',
  level: 'preference',
  scope: 'pair',
  species: STRUCK_SPECIES,
  params: PARAMS,
  start: () => ({ before: null, contrary: 0, moves: 0, together: [] }),
  step: (state, moment) => {
    const now = sonorityOf(moment)
    const { before } = state
    // Inside a bar the cantus stands still.
    if (now === null || before === null || before.bar === now.bar) return goOn({ ...state, before: now })
    return goOn({
      before: now,
      contrary: state.contrary + (isContrary(before, now) ? 1 : 0),
      moves: state.moves + 1,
      together: sharedDirection(before, now) === 0 ? state.together : [...state.together, now],
    })
  },
  finish: ({ contrary, moves, together }, { minContraryPercent }, isComplete) =>
    isComplete && together.length > 0 && 100 * contrary < minContraryPercent * moves
      ? breachAt(contrary === 0 ? 'never' : 'too-little', together, { count: contrary, of: moves })
      : null,
  key: ({ before, contrary, moves, together }) =>
    pack(
      [contrary, 256],
      [moves, 256],
      [together.length > 0 ? 1 : 0, 2],
      [packPitch(before && before.note), PITCH_ROOM],
    ),
  explain: {
    title: 'Contrary motion',
    statement: 'Contrary motion is preferred, mixed with the other kinds.',
    why: 'Voices that move against each other are heard as two. It also keeps the line from parallel fifths and octaves.',
    mends: 'Let the line rise where the cantus falls, and fall where it rises.',
    sources: cite('FUXE', 'MANNF', 'OMT1', 'DAVD', 'CHER 5th order r2'),
    disagreement: 'No source says how much is enough.',
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: {
      cantus: 'C4 D4 F4 E4 D4 C4',
      line: 'G4 B4 D5 C5 B4 C5',
      mode: 'ionian',
      final: 'C',
      breaches: [5],
    },
    messages: {
      'too-little': 'Contrary motion makes up {count} of {of} moves.',
      never: 'The voices never move against each other.',
    },
  },
}

import { z } from 'zod'
import {
  ALL_SPECIES,
  breachAt,
  isNoted,
  pack,
  packPitch,
  spanArgs,
  goOn,
  type Noted,
} from '@/shared/rules/fold'
import type { Breach, Rule, Voice } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  diminished: z
    .enum(['never', 'fifth-turned-back', 'turned-back'])
    .default('never')
    .describe(
      'Diminished leaps: never; the fifth, when the next note steps back inside it; any, on the same condition.',
    ),
})
type Params = z.infer<typeof params>

/** `owesReturn`: the leap from `first` to `before` is diminished, and the next note must step back. */
type State = Readonly<{ voice: Voice; before: Noted | null; owesReturn: Noted | null }>

/** Semitones of the smallest and largest plain interval of each simple size. */
const PLAIN: readonly (readonly [number, number])[] = [
  [0, 0],
  [1, 2],
  [3, 4],
  [5, 5],
  [7, 7],
  [8, 9],
  [10, 11],
]

/** How far an interval lies outside the plain ones of its size: positive augmented, negative diminished. */
function excessOf(steps: number, semitones: number): number {
  const size = Math.abs(steps)
  const octaves = Math.floor(size / 7)
  const width = (steps < 0 ? -semitones : semitones) - 12 * octaves
  const [narrow, wide] = PLAIN[size % 7] as readonly [number, number]
  return width > wide ? width - wide : width < narrow ? width - narrow : 0
}

const say = (voice: Voice, code: string, moments: readonly Noted[]): Breach =>
  breachAt(voice, code, moments, spanArgs(moments[0] as Noted, moments[1] as Noted))

export const melAugDim: Rule<State, Params> = {
  id: 'mel-aug-dim',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, before: null, owesReturn: null }),
  step: (state, moment, { diminished }) => {
    if (!isNoted(moment)) {
      return goOn(moment.note === null ? { ...state, before: null, owesReturn: null } : state)
    }
    const { voice, before, owesReturn } = state
    if (before === null) return goOn({ voice, before: moment, owesReturn: null })
    const steps = stepsFrom(before.note, moment.note)
    const hasTurned = owesReturn === null || steps === -Math.sign(stepsFrom(owesReturn.note, before.note))
    const late = hasTurned ? null : say(voice, 'diminished', [owesReturn, before, moment])
    const excess = steps === 0 ? 0 : excessOf(steps, semitonesFrom(before.note, moment.note))
    const mayTurn =
      diminished === 'turned-back' || (diminished === 'fifth-turned-back' && Math.abs(steps) === 4)
    const owes = excess < 0 && mayTurn && !moment.isLast
    const now =
      excess === 0 || owes ? null : say(voice, excess > 0 ? 'augmented' : 'diminished', [before, moment])
    return { state: { voice, before: moment, owesReturn: owes ? before : null }, breach: late ?? now }
  },
  finish: () => null,
  key: ({ before, owesReturn }) =>
    pack(
      [packPitch(before && before.note), 512],
      [before && owesReturn ? 1 + (stepsFrom(owesReturn.note, before.note) > 0 ? 1 : 0) : 0, 3],
    ),
  reach: 2,
  explain: {
    title: 'No augmented or diminished interval',
    statement: 'A line makes no augmented and no diminished interval between neighbouring notes.',
    why: 'Such intervals are written far apart for how they sound, and singers miss them. The tritone from F to B is the one met most.',
    mends: 'Change one of the two notes by a step, or pass through a note between.',
    sources: [
      { source: 'MANNF' },
      { source: 'CFH', place: 'rule 3' },
      { source: 'BRIDGE', place: 'ch. 1' },
      { source: 'LEHM', place: 'lesson I' },
      { source: 'RWU' },
    ],
    right: { cantus: 'D4 F4 C5 B4 A4 G4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 B4 A4 G4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      augmented: 'From {from} to {to} is an {interval}.',
      diminished: 'From {from} to {to} is a {interval}.',
    },
    disagreement:
      'Bridge and Lehmann allow a diminished fifth, one handout any diminished interval, when the line turns back by step.',
  },
}

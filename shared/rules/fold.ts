/** What the rules' folds share: remembering a note or two, packing states into numbers, saying where a breach is. */
import type { Breach, Exercise, Moment, Rule, Species, Step, Voice } from '@/shared/rules/rule'
import { intervalBetween } from '@/shared/theory/interval'
import { nameInterval } from '@/shared/theory/interval-name'
import { diatonicNumber, formatPitch, type Pitch } from '@/shared/theory/pitch'

export const ALL_SPECIES: ReadonlySet<Species> = new Set<Species>([1, 2, 3, 4, 5])

/** A moment at which the judged voice sounds. */
export type Noted = Moment & Readonly<{ note: Pitch }>

export const isNoted = (moment: Moment): moment is Noted => moment.note !== null && moment.note !== 'rest'

/** The next state with nothing to report. */
export const goOn = <State>(state: State): Step<State> => ({ state, breach: null })

/** What stays the same all along the line. */
export type Frame = Readonly<{ exercise: Exercise; voice: Voice }>

/** A spelled pitch as a whole number below 512; 0 stands for none. */
export const packPitch = (pitch: Pitch | null): number =>
  pitch === null ? 0 : 5 * diatonicNumber(pitch) + pitch.alteration + 3

/** Room that `packPitch` needs. */
export const PITCH_ROOM = 512

/** Packs whole numbers into one: pairs of a value and the room it needs. */
export function pack(...fields: readonly (readonly [value: number, room: number])[]): number {
  let key = 0
  for (const [value, room] of fields) key = key * room + value
  return key
}

/** A breach that points at some moments of one voice, with the values its sentence needs. */
export function breachAt(
  voice: Voice,
  code: string,
  moments: readonly Moment[],
  args: Breach['args'] = {},
): Breach {
  return {
    code,
    bars: barsOf(moments),
    notes: moments.map(({ bar, place }) => ({ voice, bar, place })),
    args,
  }
}

/** Bars of moments, each once, ascending; moments come in the order of the score as a rule, or nearly so. */
function barsOf(moments: readonly Moment[]): readonly number[] {
  const bars: number[] = []
  let isAscending = true
  for (const { bar } of moments) {
    const last = bars[bars.length - 1]
    if (last === bar) continue
    if (last !== undefined && last > bar) isAscending = false
    bars.push(bar)
  }
  return isAscending ? bars : [...new Set(bars)].sort((a, b) => a - b)
}

/** The same breach, said as a preference whatever the rule's level. */
export const asRemark = (breach: Breach): Breach => ({ ...breach, isRemark: true })

/** Names of two notes and of the interval between them, for sentences. */
export const spanArgs = (a: Noted, b: Noted): Breach['args'] => ({
  from: formatPitch(a.note),
  to: formatPitch(b.note),
  interval: nameInterval(intervalBetween(a.note, b.note)),
})

type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'>

export type OneBehind = Readonly<{ frame: Frame; before: Noted | null }>

/** A rule of neighbouring notes: judges each note with the one before it. Rests are passed over. */
export const foldPairs = <Params>(
  judge: (before: Noted, now: Noted, params: Params, frame: Frame) => Breach | null,
): Fold<OneBehind, Params> => ({
  start: (exercise, _params, voice) => ({ frame: { exercise, voice }, before: null }),
  step: (state, moment, params) => {
    if (!isNoted(moment)) return goOn(moment.note === null ? { ...state, before: null } : state)
    const { frame, before } = state
    const breach = before === null ? null : judge(before, moment, params, frame)
    return { state: { frame, before: moment }, breach }
  },
  finish: () => null,
  key: ({ before }) => packPitch(before && before.note),
  reach: 1,
})

export type TwoBehind = Readonly<{ frame: Frame; first: Noted | null; before: Noted | null }>

/**
 * A rule of three notes in a row. `keeps` says whether the pair that has just sounded will matter to the next note; if
 * not, its first note is forgotten, which keeps the states few.
 */
export const foldTriples = <Params>(
  judge: (first: Noted, before: Noted, now: Noted, params: Params, frame: Frame) => Breach | null,
  keeps: (before: Noted, now: Noted, params: Params) => boolean = () => true,
): Fold<TwoBehind, Params> => ({
  start: (exercise, _params, voice) => ({ frame: { exercise, voice }, first: null, before: null }),
  step: (state, moment, params) => {
    if (!isNoted(moment)) {
      return goOn(moment.note === null ? { frame: state.frame, first: null, before: null } : state)
    }
    const { frame, first, before } = state
    const breach = first === null || before === null ? null : judge(first, before, moment, params, frame)
    const kept = before !== null && keeps(before, moment, params) ? before : null
    return { state: { frame, first: kept, before: moment }, breach }
  },
  finish: () => null,
  key: ({ first, before }) => packPitch(first && first.note) * PITCH_ROOM + packPitch(before && before.note),
  reach: 2,
})

/** A rule of single notes: judges each note by itself, and remembers nothing. */
export const foldNotes = <Params>(
  judge: (now: Noted, params: Params, frame: Frame) => Breach | null,
): Fold<Frame, Params> => ({
  start: (exercise, _params, voice) => ({ exercise, voice }),
  step: (frame, moment, params) => ({
    state: frame,
    breach: isNoted(moment) ? judge(moment, params, frame) : null,
  }),
  finish: () => null,
  key: () => 0,
  reach: 0,
})

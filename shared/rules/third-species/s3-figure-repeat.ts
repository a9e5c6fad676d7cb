import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, goOn, isNoted, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { stepsFrom } from '@/shared/theory/interval'

/** The figure of the bar before, as three moves in letters, and the notes of this bar so far. */
type State = Readonly<{ earlier: readonly Noted[]; notes: readonly Noted[] }>
const NONE: State = { earlier: [], notes: [] }

const movesOf = (notes: readonly Noted[]): readonly number[] =>
  notes.slice(1).map(({ note }, index) => stepsFrom((notes[index] as Noted).note, note))

const isSameFigure = (one: readonly Noted[], other: readonly Noted[]): boolean =>
  movesOf(one).join() === movesOf(other).join()

export const s3FigureRepeat: Rule<State, NoParams> = {
  id: 's3-figure-repeat',
  level: 'preference',
  scope: 'line',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  start: () => NONE,
  step: (state, moment) => {
    if (!isNoted(moment)) return goOn(NONE)
    const isNew = moment.place === 0
    const earlier = isNew ? (state.notes.length === 4 ? state.notes : []) : state.earlier
    const notes = isNew ? [moment] : [...state.notes, moment].slice(-4)
    const isAgain = notes.length === 4 && earlier.length === 4 && isSameFigure(earlier, notes)
    return {
      state: { earlier, notes },
      breach: isAgain ? breachAt('line', 'again', [...earlier, ...notes]) : null,
    }
  },
  finish: () => null,
  key: ({ earlier, notes }) =>
    movesOf(earlier).reduce((key, move) => 32 * key + move + 16, 1) * PITCH_ROOM * 32 * 32 * 32 +
    movesOf(notes).reduce((key, move) => 32 * key + move + 16, 1) * PITCH_ROOM +
    packPitch(notes.at(-1)?.note ?? null),
  explain: {
    title: 'No figure twice in a row',
    statement: 'Two bars in a row do not have the same figure of four notes, be it on another degree.',
    why: 'A figure that comes again at once sounds like machinery.',
    mends: 'Change the direction or a leap in one of the two bars.',
    sources: cite('NOTAV III', 'LEHM IV', 'SOLON'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,B4:1,C5:1,D5:1 G4:1,A4:1,B4:1,C#5:1 D5', [2, 3]),
    messages: { again: 'This bar repeats the figure of the bar before.' },
  },
}

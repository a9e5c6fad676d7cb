import { cite } from '@/shared/rules/cite'
import { FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, goOn } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'

/** The last bar that was found to hold other than one whole note, so that a bar is told once. */
type State = Readonly<{ toldBar: number }>

export const s1Rhythm: Rule<State, NoParams> = {
  id: 's1-rhythm',
  level: 'law',
  scope: 'line',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  start: () => ({ toldBar: 0 }),
  step: (state, moment) => {
    const { note, bar, place, ticks } = moment
    if (note === null || bar === state.toldBar) return goOn(state)
    if (note === 'rest') return { state: { toldBar: bar }, breach: breachAt('line', 'rest', [moment]) }
    if (place === 0 && ticks === WHOLE_TICKS) return goOn(state)
    return { state: { toldBar: bar }, breach: breachAt('line', 'not-one-note', [moment]) }
  },
  finish: () => null,
  key: ({ toldBar }) => toldBar,
  explain: {
    title: 'Note against note',
    statement: 'The line has one whole note against each note of the cantus.',
    why: 'First species takes rhythm away, so that all attention goes to the intervals and to how the voices move.',
    mends: 'Write one whole note in the bar.',
    sources: cite('FUXE', 'OMT1', 'CHER', 'BRIDGE', 'LEHM', 'NOTAV', 'RUSH'),
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'A4 A4:2,D5:2 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: {
      'not-one-note': 'This bar does not hold one whole note.',
      rest: 'The line rests in this bar.',
    },
  },
}

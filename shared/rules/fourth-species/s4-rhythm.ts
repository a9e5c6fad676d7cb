import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, goOn } from '@/shared/rules/fold'
import { FOURTH_SPECIES, ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Moment, Rule } from '@/shared/rules/rule'
import { HALF_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'

/** The last bar that was told, so that each is told once. */
type State = Readonly<{ toldBar: number }>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** Values alone: a bar line that is not tied over is the matter of `s4-break`, a missing rest that of `s4-open`. */
export const s4Rhythm: Rule<State, NoParams> = {
  id: 's4-rhythm',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: NO_PARAMS,
  start: () => ({ toldBar: 0 }),
  step: (state, moment) => {
    const code = moment.bar === state.toldBar ? null : judge(moment)
    if (code === null) return goOn(state)
    return { state: { toldBar: moment.bar }, breach: breachAt('line', code, [moment]) }
  },
  finish: () => null,
  key: ({ toldBar }) => toldBar,
  explain: {
    title: 'Half notes tied over the bar line',
    statement:
      'The line moves in half notes that are tied over the bar line. It may begin with a half rest, and ends with a whole note.',
    why: 'The line speaks half a bar after the cantus, so that each note is heard against two notes of the cantus and may become a dissonance without moving.',
    mends: 'Write two half notes in the bar, the second tied to the next; in the last bar a whole note.',
    sources: cite('OMT1', 'MT21C', 'LEHM VI', 'NOTAV IV', 'GROVE'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,C5:1,D5:1~ D5:2,C#5:2 D5', [2]),
    messages: {
      values: 'This bar does not hold two half notes.',
      'last-bar': 'The last bar does not hold one whole note.',
      'last-bar.mend': 'Write one whole note in the last bar.',
      rest: 'The line rests inside the exercise.',
    },
  },
}

function judge(moment: Moment): string | null {
  const { note, place, isFirst, isLast } = moment
  if (note === null) return null
  const length = ticksInBar(moment)
  if (note === 'rest') return isFirst && length === HALF_TICKS ? null : 'rest'
  if (isLast) return place === 0 && length === WHOLE_TICKS ? null : 'last-bar'
  return place % HALF_TICKS === 0 && length === HALF_TICKS ? null : 'values'
}

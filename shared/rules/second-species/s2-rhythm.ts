import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn } from '@/shared/rules/fold'
import type { Moment, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES, ticksInBar } from '@/shared/rules/second-species/folds'
import { HALF_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  wholePenultimate: z.boolean().default(true).describe('The last bar but one may hold one whole note.'),
})
type Params = z.infer<typeof PARAMS>

/** The last bar that was told, so that each is told once. */
type State = Readonly<{ toldBar: number }>

/** Values alone: whether the line begins with its rest is the matter of `s2-open-rest`. */
export const s2Rhythm: Rule<State, Params> = {
  id: 's2-rhythm',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => ({ toldBar: 0 }),
  step: (state, moment, params) => {
    const code = moment.bar === state.toldBar ? null : judge(moment, params)
    if (code === null) return goOn(state)
    return { state: { toldBar: moment.bar }, breach: breachAt('line', code, [moment]) }
  },
  finish: () => null,
  key: ({ toldBar }) => toldBar,
  explain: {
    title: 'Two notes against one',
    statement:
      'The line has two half notes against each note of the cantus, and a whole note in the last bar. It may begin with a half rest.',
    why: 'With two notes to the bar there is a strong place and a weak one, and on the weak one a dissonance can pass.',
    mends: 'Write two half notes in the bar; in the last bar one whole note.',
    sources: cite('OMT1', 'CHER r9', 'LEHM II', 'BRIDGE ch. 2', 'DAVD', 'EX'),
    disagreement:
      'Three sources allow one whole note in the last bar but one; none of Fux’s twelve examples has it.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 D5 B4:2,C#5:2 D5', [2]),
    messages: {
      values: 'This bar does not hold two half notes.',
      'last-bar': 'The last bar does not hold one whole note.',
      'last-bar.mend': 'Write one whole note in the last bar.',
      rest: 'The line rests inside the exercise.',
      tied: 'The line ties a note over, which belongs to fourth species.',
      'tied.mend': 'Strike a new note here.',
    },
  },
}

function judge(moment: Moment, { wholePenultimate }: Params): string | null {
  const { note, place, isStruck, isFirst, isPenultimate, isLast } = moment
  if (note === null) return null
  const length = ticksInBar(moment)
  if (note === 'rest') return isFirst && length === HALF_TICKS ? null : 'rest'
  if (!isStruck) return 'tied'
  const isWhole = place === 0 && length === WHOLE_TICKS
  if (isLast) return isWhole ? null : 'last-bar'
  if (isWhole && isPenultimate && wholePenultimate) return null
  return place % HALF_TICKS === 0 && length === HALF_TICKS ? null : 'values'
}

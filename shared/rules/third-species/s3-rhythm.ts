import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn } from '@/shared/rules/fold'
import type { Moment, Rule } from '@/shared/rules/rule'
import { ticksInBar } from '@/shared/rules/second-species/folds'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { HALF_TICKS, QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  halfAtClose: z.boolean().default(false).describe('The last bar but one may end with a half note.'),
})
type Params = z.infer<typeof PARAMS>

/** The last bar that was told, so that each is told once; and whether only rests have been read. */
type State = Readonly<{ toldBar: number; isResting: boolean }>

/** Values alone: how long the line may rest at its beginning is the matter of `s3-open`, a tie that of `s3-repeat`. */
export const s3Rhythm: Rule<State, Params> = {
  id: 's3-rhythm',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  start: () => ({ toldBar: 0, isResting: true }),
  step: ({ toldBar, isResting }, moment, params) => {
    const code = moment.bar === toldBar ? null : judge(moment, isResting, params)
    const stillRests = isResting && moment.note === 'rest' && moment.place + moment.ticks < WHOLE_TICKS
    if (code === null) return goOn({ toldBar, isResting: stillRests })
    return {
      state: { toldBar: moment.bar, isResting: stillRests },
      breach: breachAt('line', code, [moment]),
    }
  },
  finish: () => null,
  key: ({ toldBar, isResting }) => 2 * toldBar + (isResting ? 1 : 0),
  explain: {
    title: 'Four notes against one',
    statement:
      'The line has four quarter notes against each note of the cantus, and a whole note in the last bar.',
    why: 'Four notes to the bar make a flowing line, with room for passing notes between the consonances that carry it.',
    mends: 'Write four quarter notes in the bar; in the last bar one whole note.',
    sources: cite('OMT1', 'LEHM IV', 'NOTAV III', 'RUSH III', 'MT21C', 'DAVID', 'EX'),
    disagreement: 'One course lets the last bar but one end with a half note.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:2,A4:1,Bb4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: {
      values: 'This bar does not hold four quarter notes.',
      'last-bar': 'The last bar does not hold one whole note.',
      'last-bar.mend': 'Write one whole note in the last bar.',
      rest: 'The line rests inside the exercise.',
    },
  },
}

function judge(moment: Moment, isResting: boolean, { halfAtClose }: Params): string | null {
  const { note, place, isPenultimate, isLast } = moment
  if (note === null) return null
  const length = ticksInBar(moment)
  if (note === 'rest') {
    const isOpening = isResting && place + length < WHOLE_TICKS
    if (!isOpening) return 'rest'
    return length % QUARTER_TICKS === 0 ? null : 'values'
  }
  if (isLast) return place === 0 && length === WHOLE_TICKS ? null : 'last-bar'
  if (halfAtClose && isPenultimate && place === HALF_TICKS && length === HALF_TICKS) return null
  return place % QUARTER_TICKS === 0 && length === QUARTER_TICKS ? null : 'values'
}

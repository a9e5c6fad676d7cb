import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { directionFrom, stepsFrom, type Direction } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  excuseTurn: z.boolean().default(false).describe('Let pass a leap against the way the line came.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{ before: Noted | null; came: Direction }>

export const s3BarlineStep: Rule<State, Params> = {
  id: 's3-barline-step',
  level: 'preference',
  scope: 'line',
  species: THIRD_SPECIES,
  params: PARAMS,
  start: () => ({ before: null, came: 0 }),
  step: ({ before, came }, moment, { excuseTurn }) => {
    if (!isNoted(moment)) return goOn({ before: null, came: 0 })
    if (before === null) return goOn({ before: moment, came: 0 })
    const direction = directionFrom(before.note, moment.note)
    const state = { before: moment, came: excuseTurn ? direction : 0 } as const
    const steps = Math.abs(stepsFrom(before.note, moment.note))
    if (before.bar === moment.bar || steps < 2) return goOn(state)
    if (excuseTurn && came !== 0 && direction === -came) return goOn(state)
    return { state, breach: breachAt('line', 'leaps', [before, moment], { interval: nameSize(steps) }) }
  },
  finish: () => null,
  key: ({ before, came }) => pack([packPitch(before && before.note), PITCH_ROOM], [came + 1, 3]),
  reach: 2,
  explain: {
    title: 'Step over the bar line',
    statement: 'The line crosses the bar line by step.',
    why: 'A step ties two bars together; a leap there breaks the flow just where both voices move.',
    mends: 'Leap inside the bar and step into the next one.',
    sources: cite('LEHM IV', 'OMT1'),
    disagreement: 'One school lets a leap pass that turns against the way the line came.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,B4:1,A4:1,C5:1 G4:1,A4:1,B4:1,C#5:1 D5', [3]),
    messages: { leaps: 'The line leaps a {interval} over the bar line.' },
  },
}

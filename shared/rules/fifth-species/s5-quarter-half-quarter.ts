import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import { ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { HALF_TICKS, QUARTER_TICKS } from '@/shared/theory/duration'

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5QuarterHalfQuarter: Rule<Exercise, NoParams> = {
  id: 's5-quarter-half-quarter',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) => {
    if (!now.isStruck || now.place !== QUARTER_TICKS || ticksInBar(now) < HALF_TICKS) return null
    return breachAt(ticksInBar(now) === HALF_TICKS ? 'half' : 'dotted', [now], {}, 'line')
  }),
  explain: {
    title: 'No long note on the second quarter',
    statement: 'A half note or a dotted half does not begin on the second quarter of the bar.',
    why: 'It covers the middle of the bar and pulls against the beat from a place where nothing supports it.',
    mends: 'Begin the long note on the first or third quarter.',
    sources: cite('FLASH'),
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,C5:2,D5:1 D5:2,C#5:2 D5', [2]),
    messages: {
      half: 'A half note begins on the second quarter.',
      dotted: 'A dotted half note begins on the second quarter.',
    },
  },
}

import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn } from '@/shared/rules/fold'
import { isUpbeat, ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { HALF_TICKS, QUARTER_TICKS } from '@/shared/theory/duration'

/** The notes of this bar as long as they keep to the rhythm; three of them wait for the next bar. */
type State = Readonly<{ notes: readonly Sonority[] }>
const NONE: State = { notes: [] }

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5QuarterQuarterHalf: Rule<State, NoParams> = {
  id: 's5-quarter-quarter-half',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: NO_PARAMS,
  start: () => NONE,
  step: ({ notes }, moment) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    if (now.place === 0) {
      const state = { notes: ticksInBar(now) === QUARTER_TICKS ? [now] : [] }
      const isLetGo = notes.length === 3 && now.isStruck
      return { state, breach: isLetGo ? breachAt('not-tied', notes, {}, 'line') : null }
    }
    const isSecond = notes.length === 1 && now.place === QUARTER_TICKS && ticksInBar(now) === QUARTER_TICKS
    const isHalf = notes.length === 2 && isUpbeat(now) && ticksInBar(now) === HALF_TICKS
    return goOn(isSecond || isHalf ? { notes: [...notes, now] } : NONE)
  },
  finish: () => null,
  key: ({ notes }) => notes.length,
  explain: {
    title: 'Two quarters and a half',
    statement:
      'Two quarters on the first half of a bar are not followed by a half note, unless it is tied over.',
    why: 'Short notes on the strong half and a long one on the weak half turn the bar upside down. A tie gives the long note a reason.',
    mends: 'Tie the half note over, or divide it.',
    sources: cite('FUX°', 'LEHM IX', 'E2-5', 'FLASH', 'EX'),
    disagreement: 'Fux ties it in nearly every bar, and leaves it untied a few times.',
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,B4:1,C5:2 B4:2,C#5:2 D5', [2]),
    messages: { 'not-tied': 'The half note after two quarters is not tied over.' },
  },
}

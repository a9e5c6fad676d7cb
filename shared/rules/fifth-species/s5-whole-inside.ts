import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import { ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5WholeInside: Rule<Exercise, NoParams> = {
  id: 's5-whole-inside',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) =>
    !now.isLast && ticksInBar(now) === WHOLE_TICKS ? breachAt('whole', [now], {}, 'line') : null,
  ),
  explain: {
    title: 'No whole notes inside',
    statement: 'A whole note stands only in the last bar.',
    why: 'A bar in which neither voice moves again stops the piece before its end.',
    mends: 'Divide the whole note, or tie half of it over.',
    sources: cite('RUSH V', 'OMT2'),
    disagreement:
      'One textbook leaves whole notes out; another lists the movement of first species among the possible ones.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4 D5:2,C#5:2 D5', [2]),
    messages: { whole: 'This bar holds one whole note, and is not the last.' },
  },
}

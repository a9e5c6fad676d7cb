import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isDissonance, nameOf } from '@/shared/rules/first-species/sonority'
import { FOURTH_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4UpbeatConsonant: Rule<Exercise, NoParams> = {
  id: 's4-upbeat-consonant',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) =>
    now.place > 0 && isDissonance(now) ? breachAt('dissonant', [now], { interval: nameOf(now) }) : null,
  ),
  explain: {
    title: 'The second half of the bar is consonant',
    statement: 'The note that begins in the second half of a bar agrees with the cantus.',
    why: 'It is the resolution of one dissonance and the preparation of the next; both have to be at rest.',
    mends: 'Write a third, fifth, sixth or octave in the second half of the bar.',
    sources: cite('OMT1', 'MT21C', 'LIST', 'GROVE', 'NOTAV IV', 'LEHM', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,B4:2~ B4:2,C#5:2 D5', [2]),
    messages: { dissonant: 'The second half of the bar is a {interval}, which is dissonant.' },
  },
}

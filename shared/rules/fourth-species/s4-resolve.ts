import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isDissonance, nameOf, sonorityOf } from '@/shared/rules/first-species/sonority'
import { afterSome, FOURTH_SPECIES, isStepDown, isStepUp } from '@/shared/rules/fourth-species/folds'
import type { AfterState } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { isSamePitch } from '@/shared/theory/pitch'

const example = exampleIn(4, 'D4 F4 E4 D4')

/**
 * A dissonance may stand on a downbeat only as a note held over, and then falls by step. That the note it falls to is
 * consonant is the matter of `s4-upbeat-consonant`; that it does not rise by step, that of `s4-retardation`.
 */
const resolution = afterSome<NoParams>(
  (now) => now.place === 0 && isDissonance(now),
  (before, now) => {
    if (isStepDown(before, now) || isStepUp(before, now)) return null
    const code = isSamePitch(before.note, now.note) ? 'stays' : 'leaps'
    return breachAt(code, [before, now], { interval: nameOf(before) }, 'line')
  },
)

export const s4Resolve: Rule<AfterState, NoParams> = {
  id: 's4-resolve',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: NO_PARAMS,
  ...resolution,
  step: (state, moment, params) => {
    const next = resolution.step(state, moment, params)
    const now = sonorityOf(moment)
    if (next.breach || now === null || now.place !== 0 || !isDissonance(now)) return next
    const args = { interval: nameOf(now) }
    // A dissonance that was never prepared has nothing to resolve: it is told once.
    if (now.isStruck) {
      return { state: { ...state, before: null }, breach: breachAt('struck', [now], args) }
    }
    return moment.isLast ? { ...next, breach: breachAt('last', [now], args) } : next
  },
  explain: {
    title: 'Suspensions resolve down by step',
    statement: 'A dissonance on the downbeat is a note held over, and it falls by step to a consonance.',
    why: 'The note was at rest when it began; the cantus moves away under it, and the ear waits for it to give way. Falling a step is how it gives way.',
    mends: 'Tie the note over from a consonance, and go one step down from it.',
    sources: cite('OMT1', 'MT21C', 'LIST', 'GROVE', 'NOTAV IV-ii', 'SCHG', 'TTU', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,D5:2~ D5:2,G4:2 D5', [3]),
    messages: {
      struck: 'The downbeat is a {interval} that was not held over from the bar before.',
      leaps: 'The suspended {interval} is left by a leap, not by a step down.',
      stays: 'The suspended {interval} stays and does not resolve.',
      last: 'The line ends on a {interval} that does not resolve.',
    },
  },
}

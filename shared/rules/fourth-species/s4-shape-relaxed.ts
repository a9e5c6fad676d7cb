import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import { FOURTH_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const PARAMS = z.strictObject({
  leapsUp: z.int().min(0).max(99).default(2).describe('Upward leaps in a line that restore its register.'),
  from: z.int().min(3).max(8).default(4).describe('The smallest interval that counts as such a leap.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{ before: Noted | null; leaps: readonly Noted[] }>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** While it is on, the rules of a line's outline in `suspends` are not asked in its species. */
export const s4ShapeRelaxed: Rule<State, Params> = {
  id: 's4-shape-relaxed',
  level: 'preference',
  scope: 'line',
  species: FOURTH_SPECIES,
  params: PARAMS,
  suspends: new Set(['mel-single-climax', 'mel-climax-place', 'mel-arch', 'mel-run-one-direction']),
  start: () => ({ before: null, leaps: [] }),
  step: ({ before, leaps }, moment, { leapsUp, from }) => {
    if (!isNoted(moment)) return goOn({ before: null, leaps })
    if (before === null || stepsFrom(before.note, moment.note) < from - 1)
      return goOn({ before: moment, leaps })
    const kept = [...leaps.slice(-leapsUp), moment].slice(-(leapsUp + 1))
    return {
      state: { before: moment, leaps: kept },
      breach:
        kept.length > leapsUp ? breachAt('line', 'too-many', [before, moment], { count: leapsUp }) : null,
    }
  },
  finish: () => null,
  key: ({ before, leaps }) => pack([packPitch(before && before.note), PITCH_ROOM], [leaps.length, 128]),
  explain: {
    title: 'The outline is free here',
    statement:
      'Suspensions lead down, so rules about the outline of a line are not asked in fourth species; one or two leaps up bring the line back to its height.',
    why: 'A line that has to fall after every dissonance cannot also rise to one peak. What it can do is leap up from a consonant tie, and not too often.',
    mends: 'Gain height by steps from consonant ties instead of another leap.',
    sources: cite('OMT1'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,D4:2~ D4:2,A4:2~ A4:2,C#5:2 D5', [2], { params: { leapsUp: 0 } }),
    messages: { 'too-many': 'The line leaps up once more, and has done so often enough.' },
  },
}

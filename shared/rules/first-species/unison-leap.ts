import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import {
  breachAt,
  cantusMove,
  isUnison,
  lineMove,
  lineSpan,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES, goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import type { Direction } from '@/shared/theory/interval'

const PARAMS = z.strictObject({
  leave: z
    .enum(['any-step', 'turning-back', 'going-on-after-oblique'])
    .default('turning-back')
    .describe(
      'How a unison is left: by any step; by a step against the way it was reached; or, reached while the cantus stood still, by going on the same way.',
    ),
})
type Params = z.infer<typeof PARAMS>

/** The sonority before, and how the line came to it when it is a unison. */
type State = Readonly<{ before: Sonority | null; came: Direction; wasOblique: boolean }>
const NONE: State = { before: null, came: 0, wasOblique: false }

export const unisonLeap: Rule<State, Params> = {
  id: 'unison-leap',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    const { before } = state
    if (before === null) return goOn({ ...NONE, before: now })
    const isHere = isUnison(now)
    return {
      state: {
        before: now,
        came: isHere ? lineMove(before, now) : 0,
        wasOblique: isHere && cantusMove(before, now) === 0,
      },
      breach: judge(state, before, now, params),
    }
  },
  finish: () => null,
  key: ({ before, came, wasOblique }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [came + 1, 3], [wasOblique ? 1 : 0, 2]),
  explain: {
    title: 'Step into a unison and out of it',
    statement: 'The line does not leap into a unison or out of it, and leaves it against the way it came.',
    why: 'Where the voices meet they are hard to tell apart; a step keeps each on its own path.',
    mends: 'Come to the unison by step, and step back out of it.',
    sources: cite('PERF (Salzer and Schachter)', 'LEHM IV', 'FUX°'),
    disagreement:
      'One school turns back out of a unison; another, when the line came to it alone, lets it go on in the same direction.',
    right: {
      cantus: 'D4 F4 E4 D4',
      line: 'D4 D4 C#4 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'D4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: {
      into: 'The line leaps into a unison.',
      'out-of': 'The line leaps out of a unison.',
      'out-of.mend': 'Leave the unison by step.',
      'goes-on': 'The line goes through the unison without turning back.',
      'goes-on.mend': 'Step back the way it came.',
      'turns-back': 'The line came to the unison alone and turns back from it.',
      'turns-back.mend': 'Go on by step in the same direction.',
    },
  },
}

function judge(state: State, before: Sonority, now: Sonority, { leave }: Params): Breach | null {
  const isLeap = lineSpan(before, now) >= 2
  if (isUnison(before)) {
    if (isLeap) return breachAt('out-of', [before, now])
    const goes = lineMove(before, now)
    if (leave === 'turning-back' && goes !== 0 && goes === state.came) {
      return breachAt('goes-on', [before, now])
    }
    if (leave === 'going-on-after-oblique' && state.wasOblique && goes !== 0 && goes === -state.came) {
      return breachAt('turns-back', [before, now])
    }
  }
  return isUnison(now) && isLeap ? breachAt('into', [before, now]) : null
}

import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { FIRST_SPECIES } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  cantusMove,
  lineMove,
  perfectKindOf,
  sharedDirection,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  motion: z
    .enum(['contrary-or-oblique', 'contrary', 'any'])
    .default('contrary-or-oblique')
    .describe('How one perfect consonance may go to a different one.'),
  maxInRow: z.int().min(1).max(99).default(99).describe('Perfect consonances in a row, of whatever kind.'),
})
type Params = z.infer<typeof PARAMS>

/** The perfect consonances that have just followed each other. */
type State = Readonly<{ run: readonly Sonority[] }>
const NONE: State = { run: [] }

export const perfectToPerfect: Rule<State, Params> = {
  id: 'perfect-to-perfect',
  level: 'preference',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    if (now === null || perfectKindOf(now) === null) return goOn(NONE)
    // One more than the limit is enough to know that the limit is passed.
    const run = [...state.run.slice(-params.maxInRow), now]
    return { state: { run }, breach: judge(run, params) }
  },
  finish: () => null,
  key: ({ run }) => pack([run.length, 100], [packPitch(run.at(-1)?.note ?? null), PITCH_ROOM]),
  explain: {
    title: 'From one perfect consonance to another',
    statement:
      'A fifth may follow an octave, or an octave a fifth, only by contrary or oblique motion, and not too often.',
    why: 'Perfect consonances sound hollow beside thirds and sixths. Several in a row leave a hole in the music, the more so when both voices go the same way.',
    mends: 'Put a third or a sixth between them, or move the line against the cantus.',
    sources: cite('FUXN r1', 'PERF (Diruta)', 'HSR soft 4', 'OMT1'),
    disagreement: 'One old source asks for contrary motion alone; another counts, and allows two in a row.',
    right: {
      cantus: 'D4 G4 F4 G4 E4 D4',
      line: 'D5 B4 D5 E5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
      params: { maxInRow: 2 },
    },
    wrong: {
      cantus: 'D4 G4 F4 G4 E4 D4',
      line: 'D5 D5 F5 E5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
      params: { maxInRow: 2 },
    },
    messages: {
      'same-way': 'One perfect consonance goes to another with both voices moving the same way.',
      'not-contrary': 'One perfect consonance goes to another without contrary motion.',
      'too-many': 'This is perfect consonance number {count} in a row.',
      'too-many.mend': 'Write a third or a sixth here.',
    },
  },
}

function judge(run: readonly Sonority[], { motion, maxInRow }: Params): Breach | null {
  const now = run.at(-1) as Sonority
  const before = run.at(-2)
  if (before === undefined) return null
  if (motion !== 'any' && perfectKindOf(before) !== perfectKindOf(now)) {
    if (sharedDirection(before, now) !== 0) return breachAt('same-way', [before, now])
    const isOblique = lineMove(before, now) * cantusMove(before, now) === 0
    if (motion === 'contrary' && isOblique) return breachAt('not-contrary', [before, now])
  }
  return run.length > maxInRow ? breachAt('too-many', run, { count: run.length }) : null
}

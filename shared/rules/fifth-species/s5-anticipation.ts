import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import { isStepDown, isTiedOver, isUpbeat } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { QUARTER_TICKS } from '@/shared/theory/duration'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  allowed: z.boolean().default(true).describe('The resolution may be struck a quarter early and again.'),
})
type Params = z.infer<typeof PARAMS>

/** The note before, and whether it is the early resolution of a note held over. */
type State = Readonly<{ before: Sonority | null; isEarly: boolean }>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5Anticipation: Rule<State, Params> = {
  id: 's5-anticipation',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => ({ before: null, isEarly: false }),
  step: ({ before, isEarly }, moment, { allowed }) => {
    const now = sonorityOf(moment)
    if (now === null || before === null) return goOn({ before: now, isEarly: false })
    if (!now.isStruck || !isSamePitch(before.note, now.note)) {
      const isResolution = isTiedOver(before) && now.place === QUARTER_TICKS && isStepDown(before, now)
      return goOn({ before: now, isEarly: isResolution })
    }
    const args = { note: formatPitch(now.note) }
    const state = { before: now, isEarly: false }
    if (!(isEarly && isUpbeat(now)))
      return { state, breach: breachAt('repeated', [before, now], args, 'line') }
    return { state, breach: allowed ? null : breachAt('early', [before, now], args, 'line') }
  },
  finish: () => null,
  key: ({ before, isEarly }) =>
    pack(
      [packPitch(before && before.note), PITCH_ROOM],
      [before !== null && isTiedOver(before) ? 1 : 0, 2],
      [isEarly ? 1 : 0, 2],
    ),
  explain: {
    title: 'A resolution struck early',
    statement:
      'Notes are not struck twice in a row, except that the note to which a held one falls may be struck a quarter early and again on the third.',
    why: 'A repeated note stops the line. The early resolution alone is heard as an ornament of the falling step.',
    mends: 'Move to another note, or tie the two together.',
    sources: cite('OMT2', 'GIRT', 'LEHM IX', 'JEPP°', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:1,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,C5:1,C5:2~ C5:2,C#5:2 D5', [2]),
    messages: {
      repeated: 'The {note} is struck twice in a row.',
      early: 'The resolution, {note}, is struck early and again, which this rule set does not use.',
    },
  },
}

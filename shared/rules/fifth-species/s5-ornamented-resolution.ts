import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES, isEighth } from '@/shared/rules/fifth-species/folds'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import { isStepDown, isSuspension, isUpbeat } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { HALF_TICKS } from '@/shared/theory/duration'

const FORMS = ['eighths', 'leap-down', 'step-up', 'third-down'] as const
type Form = (typeof FORMS)[number]

const PARAMS = z.strictObject({
  forms: z
    .array(z.enum(FORMS))
    .default([...FORMS])
    .describe(
      'Decorations: a pair of eighths through the resolution, a leap down and back up, a step up and a third down, a third down and a step up.',
    ),
})
type Params = z.infer<typeof PARAMS>

/** A suspension, and the notes that have sounded since; more than two are never a decoration that has a name. */
type State = Readonly<{ suspended: Sonority | null; notes: readonly Sonority[] }>
const NONE: State = { suspended: null, notes: [] }
const MOST_NOTES = 3

const example = exampleIn(5, 'D4 F4 E4 D4')

/**
 * Told where the resolution comes on the third quarter, after notes between. That it comes at all is the matter of
 * `s5-mix`; that it may be struck early and again, of `s5-anticipation`.
 */
export const s5OrnamentedResolution: Rule<State, Params> = {
  id: 's5-ornamented-resolution',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: ({ suspended, notes }, moment, { forms }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    if (now.place === 0) return goOn(isSuspension(now) ? { suspended: now, notes: [] } : NONE)
    if (suspended === null) return goOn(NONE)
    if (!isUpbeat(now)) {
      const isPast = now.place > HALF_TICKS
      return goOn(isPast ? NONE : { suspended, notes: [...notes, now].slice(0, MOST_NOTES) })
    }
    if (notes.length === 0 || !isStepDown(suspended, now)) return goOn(NONE)
    const form = formOf(suspended, notes)
    const isKnown = form === 'plain' || (form !== null && forms.includes(form))
    return { state: NONE, breach: isKnown ? null : breachAt('form', [suspended, now], {}, 'line') }
  },
  finish: () => null,
  key: ({ suspended, notes }) =>
    pack(
      [packPitch(suspended && suspended.note), PITCH_ROOM],
      [packPitch(notes[0]?.note ?? null), PITCH_ROOM],
      [packPitch(notes[1]?.note ?? null), PITCH_ROOM],
      [notes.length, MOST_NOTES + 1],
      [notes[0] !== undefined && isEighth(notes[0]) ? 1 : 0, 2],
    ),
  explain: {
    title: 'Decorating the resolution',
    statement:
      'A suspension may touch other notes before it resolves, if the resolution still arrives on the third quarter: a pair of eighths, a leap down and back up, a step up and a third down, a third down and a step up.',
    why: 'The ear waits for the note below. A small detour makes the waiting sweeter, as long as it ends where and when it was expected.',
    mends: 'Use one of the known figures, or resolve at once.',
    sources: cite('NOTAV V i–v', 'OMT2', 'GIRT', 'LEHM IX', 'CHER 5th', 'EX'),
    disagreement:
      'Most sources have the decorated resolution on the third quarter; one lets it fall on the quarters either side. Fux departs from the third quarter once.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,D5:2~ D5:1,E5:0.5,F5:0.5,C#5:2 D5', [3]),
    messages: { form: 'The resolution is decorated with a figure that this rule set does not use.' },
  },
}

/** Names the decoration; `plain` where the resolution was struck early and is struck again, or went nowhere else. */
function formOf(suspended: Sonority, notes: readonly Sonority[]): Form | 'plain' | null {
  const [one, two, more] = notes
  if (one === undefined || more !== undefined) return null
  const first = stepsFrom(suspended.note, one.note)
  if (two === undefined) {
    if (first === -1) return 'plain'
    if (first === 1) return 'step-up'
    if (first === -2) return 'third-down'
    return first < -2 ? 'leap-down' : null
  }
  const isTurn = isEighth(one) && first === -1 && Math.abs(stepsFrom(one.note, two.note)) === 1
  return isTurn ? 'eighths' : null
}

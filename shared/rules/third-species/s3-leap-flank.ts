import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Breach, Moment, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { stepsFrom } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  stepInBar: z
    .boolean()
    .default(true)
    .describe('One of the first three quarters of a bar must be left by step.'),
})
type Params = z.infer<typeof PARAMS>

/** How the line came to its last note: nothing known, by a step, by a third, by a wider leap. */
type Came = 'unknown' | 'step' | 'third' | 'wide'
const CAME: readonly Came[] = ['unknown', 'step', 'third', 'wide']

type State = Readonly<{ first: Noted | null; before: Noted | null; came: Came; hasStep: boolean }>
const NONE: State = { first: null, before: null, came: 'unknown', hasStep: true }

export const s3LeapFlank: Rule<State, Params> = {
  id: 's3-leap-flank',
  level: 'preference',
  scope: 'line',
  species: THIRD_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    if (!isNoted(moment)) return goOn(NONE)
    const { before } = state
    const steps = before === null ? 0 : Math.abs(stepsFrom(before.note, moment.note))
    const came = before === null ? 'unknown' : steps <= 1 ? 'step' : steps === 2 ? 'third' : 'wide'
    const hasStep = moment.place === 0 ? false : state.hasStep || came === 'step'
    return {
      state: { first: before, before: moment, came, hasStep },
      breach: before && judge(state, before, moment, came, hasStep, params),
    }
  },
  finish: () => null,
  key: ({ before, came, hasStep }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [CAME.indexOf(came), 4], [hasStep ? 1 : 0, 2]),
  explain: {
    title: 'Steps round a leap',
    statement:
      'A leap wider than a third has a step before it and a step after it, and in every bar at least one of the first three quarters is left by step.',
    why: 'Among quick notes a leap stands out; steps on both sides bind it into the line.',
    mends: 'Step to the note from which the line leaps, and step on after it.',
    sources: cite('RUSH III', 'LEHM IV'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,A4:1 D5:1,C5:1,B4:1,Bb4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: {
      'leap-before': 'The line leaps a {interval} right after another leap.',
      'leap-after': 'After its leap of a {interval} the line leaps again.',
      'no-step': 'In this bar the line only leaps.',
      'no-step.mend': 'Put a step among the first quarters of the bar.',
    },
  },
}

function judge(
  state: State,
  before: Noted,
  now: Noted,
  came: Came,
  hasStep: boolean,
  { stepInBar }: Params,
): Breach | null {
  const tell = (code: string, moments: readonly Moment[], from: Noted, to: Noted): Breach =>
    breachAt('line', code, moments, { interval: nameSize(Math.abs(stepsFrom(from.note, to.note))) })
  if (state.first !== null && came !== 'step') {
    const moments = [state.first, before, now]
    if (state.came === 'wide') return tell('leap-after', moments, state.first, before)
    if (state.came === 'third' && came === 'wide') return tell('leap-before', moments, before, now)
  }
  const isLastOfBar = now.place > 0 && now.place + now.ticks >= WHOLE_TICKS
  return stepInBar && isLastOfBar && !hasStep ? breachAt('line', 'no-step', [before, now]) : null
}

import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import { passingExample, PASSING_LINE } from '@/shared/rules/second-species/examples'
import { isUpbeat, SECOND_SPECIES, stepsTo } from '@/shared/rules/second-species/folds'
import { intervalBetween } from '@/shared/theory/interval'
import { nameInterval } from '@/shared/theory/interval-name'
import { qualityOf } from '@/shared/theory/interval'

const PARAMS = z.strictObject({
  excuseOctave: z
    .boolean()
    .default(true)
    .describe('A seventh is let pass when it comes of an octave leap and a step back.'),
})
type Params = z.infer<typeof PARAMS>

/** The downbeat of this bar and its upbeat; `isKnown` is false when the upbeat is not written. */
type State = Readonly<{ downbeat: Sonority | null; upbeat: Sonority | null; isKnown: boolean }>
const NONE: State = { downbeat: null, upbeat: null, isKnown: true }

export const s2DownbeatOutline: Rule<State, Params> = {
  id: 's2-downbeat-outline',
  level: 'preference',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    if (moment.place === 0) {
      return {
        state: { downbeat: now, upbeat: null, isKnown: true },
        breach: now && state.downbeat && judge(state.downbeat, state, now, params),
      }
    }
    if (state.downbeat === null || !params.excuseOctave) return goOn(state)
    if (now === null) return goOn({ ...state, isKnown: false })
    // Only a leap of an octave can excuse what follows.
    const isOctave = isUpbeat(now) && Math.abs(stepsTo(state.downbeat, now)) === 7
    return goOn(isOctave ? { ...state, upbeat: now } : state)
  },
  finish: () => null,
  key: ({ downbeat, upbeat, isKnown }) =>
    pack(
      [packPitch(downbeat && downbeat.note), PITCH_ROOM],
      [packPitch(upbeat && upbeat.note), PITCH_ROOM],
      [isKnown ? 1 : 0, 2],
    ),
  explain: {
    title: 'A singable line of downbeats',
    statement: 'The notes on two downbeats in a row do not stand a seventh, a ninth or a tritone apart.',
    why: 'The strong beats are remembered as a line of their own, and that line too should sing.',
    mends: 'Move one of the downbeats, so that they stand a step or a consonant leap apart.',
    sources: cite('OMT1'),
    right: passingExample(PASSING_LINE),
    wrong: passingExample('r:2,A4:2 C5:2,B4:2 D5:2,B4:2 G#4:2,C#5:2 D5', [4, 5]),
    messages: { dissonant: 'The notes on two downbeats in a row stand a {interval} apart.' },
  },
}

function judge(
  downbeat: Sonority,
  { upbeat, isKnown }: State,
  now: Sonority,
  { excuseOctave }: Params,
): Breach | null {
  const interval = intervalBetween(downbeat.note, now.note)
  const quality = qualityOf(interval)
  const isAltered = quality.startsWith('A') || quality.startsWith('d')
  if (interval.steps !== 6 && interval.steps <= 7 && !isAltered) return null
  if (!isKnown) return null
  const isExcused = excuseOctave && upbeat !== null && Math.abs(stepsTo(upbeat, now)) === 1
  if (isExcused && interval.steps === 6) return null
  return breachAt('dissonant', [downbeat, now], { interval: nameInterval(interval) }, 'line')
}

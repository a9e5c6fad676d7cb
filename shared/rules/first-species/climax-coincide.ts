import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES, goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { comparePitches, type Pitch } from '@/shared/theory/pitch'

/** Where each voice has been highest so far, and the sonorities at which both were. */
type State = Readonly<{
  lineTop: Pitch | null
  cantusTop: Pitch | null
  shared: readonly Sonority[]
}>
const NONE: readonly Sonority[] = []

const isHigher = (pitch: Pitch, top: Pitch | null): boolean => top === null || comparePitches(pitch, top) > 0
const isEqual = (pitch: Pitch, top: Pitch | null): boolean => top !== null && comparePitches(pitch, top) === 0

export const climaxCoincide: Rule<State, NoParams> = {
  id: 'climax-coincide',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  start: () => ({ lineTop: null, cantusTop: null, shared: NONE }),
  // The cantus is read on where the line is not written, so that its top is known from the place in the reading.
  step: (state, moment) => {
    const now = sonorityOf(moment)
    const { other } = moment
    const lineTop = now !== null && isHigher(now.note, state.lineTop) ? now.note : state.lineTop
    const cantusTop = other !== null && isHigher(other, state.cantusTop) ? other : state.cantusTop
    const isNewTop = lineTop !== state.lineTop || cantusTop !== state.cantusTop
    const kept = isNewTop ? NONE : state.shared
    const isBoth = now !== null && isEqual(now.note, lineTop) && isEqual(now.other, cantusTop)
    return goOn({ lineTop, cantusTop, shared: isBoth ? [...kept, now] : kept })
  },
  finish: ({ shared }, _params, isComplete) =>
    isComplete && shared.length > 0 ? breachAt('together', shared) : null,
  key: ({ lineTop, shared }) => pack([packPitch(lineTop), PITCH_ROOM], [shared.length > 0 ? 1 : 0, 2]),
  explain: {
    title: 'Two peaks, not one',
    statement: 'The two lines do not reach their highest notes in the same bar.',
    why: 'When each line has its own moment the music has two.',
    mends: 'Move the peak of the line before or after that of the cantus.',
    sources: cite('OMT1', 'ECR C2', 'EX'),
    disagreement: 'A law in one textbook. In eleven of Fux’s forty-six solutions the peaks fall together.',
    right: {
      cantus: 'D4 F4 A4 G4 F4 E4 D4',
      line: 'A4 D5 C5 E5 D5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 A4 G4 F4 E4 D4',
      line: 'A4 D5 F5 E5 D5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
    },
    messages: { together: 'Both lines reach their highest note in the same bar.' },
  },
}

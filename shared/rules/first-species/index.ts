import { accOther } from '@/shared/rules/first-species/acc-other'
import { battutaOctave } from '@/shared/rules/first-species/battuta-octave'
import { bothLeapPerfect } from '@/shared/rules/first-species/both-leap-perfect'
import { bothLeapSame } from '@/shared/rules/first-species/both-leap-same'
import { cadPhrygian } from '@/shared/rules/first-species/cad-phrygian'
import { cadRaiseSeventh } from '@/shared/rules/first-species/cad-raise-seventh'
import { cadRaiseSixth } from '@/shared/rules/first-species/cad-raise-sixth'
import { climaxCoincide } from '@/shared/rules/first-species/climax-coincide'
import { dirPerfect } from '@/shared/rules/first-species/dir-perfect'
import { distMax } from '@/shared/rules/first-species/dist-max'
import { imperfectPreferred } from '@/shared/rules/first-species/imperfect-preferred'
import { imperfectRun } from '@/shared/rules/first-species/imperfect-run'
import { intervalVariety } from '@/shared/rules/first-species/interval-variety'
import { majorThirdsRun } from '@/shared/rules/first-species/major-thirds-run'
import { modeKeep } from '@/shared/rules/first-species/mode-keep'
import { motionContrary } from '@/shared/rules/first-species/motion-contrary'
import { parPerfect } from '@/shared/rules/first-species/par-perfect'
import { parPerfectContrary } from '@/shared/rules/first-species/par-perfect-contrary'
import { perfectToPerfect } from '@/shared/rules/first-species/perfect-to-perfect'
import { relChromatic } from '@/shared/rules/first-species/rel-chromatic'
import { relTritone } from '@/shared/rules/first-species/rel-tritone'
import { s1CadenceAbove } from '@/shared/rules/first-species/s1-cadence-above'
import { s1CadenceBelow } from '@/shared/rules/first-species/s1-cadence-below'
import { s1CadenceMotion } from '@/shared/rules/first-species/s1-cadence-motion'
import { s1Close } from '@/shared/rules/first-species/s1-close'
import { s1OpenAbove } from '@/shared/rules/first-species/s1-open-above'
import { s1OpenBelow } from '@/shared/rules/first-species/s1-open-below'
import { s1Repeat } from '@/shared/rules/first-species/s1-repeat'
import { s1Rhythm } from '@/shared/rules/first-species/s1-rhythm'
import { s1Unison } from '@/shared/rules/first-species/s1-unison'
import { similarLeap } from '@/shared/rules/first-species/similar-leap'
import { unisonLeap } from '@/shared/rules/first-species/unison-leap'
import { vertConsonanceSet } from '@/shared/rules/first-species/vert-consonance-set'
import { vertDimFifth } from '@/shared/rules/first-species/vert-dim-fifth'
import { vertFourth } from '@/shared/rules/first-species/vert-fourth'
import { voiceCross } from '@/shared/rules/first-species/voice-cross'
import { voiceOverlap } from '@/shared/rules/first-species/voice-overlap'
import type { AnyRule } from '@/shared/rules/rule'

/** Rules of two voices in first species, in the order of the catalogue. */
export const FIRST_SPECIES_RULES: readonly AnyRule[] = [
  s1Rhythm,
  vertConsonanceSet,
  vertFourth,
  vertDimFifth,
  s1OpenAbove,
  s1OpenBelow,
  s1Close,
  s1CadenceAbove,
  s1CadenceBelow,
  s1CadenceMotion,
  cadRaiseSeventh,
  cadPhrygian,
  cadRaiseSixth,
  accOther,
  modeKeep,
  parPerfect,
  parPerfectContrary,
  dirPerfect,
  perfectToPerfect,
  battutaOctave,
  bothLeapPerfect,
  s1Unison,
  unisonLeap,
  imperfectPreferred,
  imperfectRun,
  majorThirdsRun,
  motionContrary,
  similarLeap,
  bothLeapSame,
  intervalVariety,
  voiceCross,
  voiceOverlap,
  distMax,
  climaxCoincide,
  s1Repeat,
  relTritone,
  relChromatic,
]

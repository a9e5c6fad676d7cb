import { cfApproachFinal } from '@/shared/rules/melody/cf-approach-final'
import { cfDiatonic } from '@/shared/rules/melody/cf-diatonic'
import { cfEndFinal } from '@/shared/rules/melody/cf-end-final'
import { cfLength } from '@/shared/rules/melody/cf-length'
import { cfNoteValues } from '@/shared/rules/melody/cf-note-values'
import { cfRange } from '@/shared/rules/melody/cf-range'
import { cfStartFinal } from '@/shared/rules/melody/cf-start-final'
import { melArch } from '@/shared/rules/melody/mel-arch'
import { melAugDim } from '@/shared/rules/melody/mel-aug-dim'
import { melChromaticStep } from '@/shared/rules/melody/mel-chromatic-step'
import { melCircling } from '@/shared/rules/melody/mel-circling'
import { melClimaxPlace } from '@/shared/rules/melody/mel-climax-place'
import { melIntervalSet } from '@/shared/rules/melody/mel-interval-set'
import { melLeadingTone } from '@/shared/rules/melody/mel-leading-tone'
import { melLeapApproach } from '@/shared/rules/melody/mel-leap-approach'
import { melLeapOrder } from '@/shared/rules/melody/mel-leap-order'
import { melLeapRecovery } from '@/shared/rules/melody/mel-leap-recovery'
import { melLeapRun } from '@/shared/rules/melody/mel-leap-run'
import { melLeapsSameDirection } from '@/shared/rules/melody/mel-leaps-same-direction'
import { melMinorDegrees } from '@/shared/rules/melody/mel-minor-degrees'
import { melMotiveRepeat } from '@/shared/rules/melody/mel-motive-repeat'
import { melNoRepeatCf } from '@/shared/rules/melody/mel-no-repeat-cf'
import { melRunOneDirection } from '@/shared/rules/melody/mel-run-one-direction'
import { melSequence } from '@/shared/rules/melody/mel-sequence'
import { melSeventh } from '@/shared/rules/melody/mel-seventh'
import { melSeventhOutline } from '@/shared/rules/melody/mel-seventh-outline'
import { melSingleClimax } from '@/shared/rules/melody/mel-single-climax'
import { melSixthLeap } from '@/shared/rules/melody/mel-sixth-leap'
import { melSomeLeaps } from '@/shared/rules/melody/mel-some-leaps'
import { melStepMajority } from '@/shared/rules/melody/mel-step-majority'
import { melTriadOutline } from '@/shared/rules/melody/mel-triad-outline'
import { melTritoneOutline } from '@/shared/rules/melody/mel-tritone-outline'
import { melTwoLeapSpan } from '@/shared/rules/melody/mel-two-leap-span'
import { voiceCompass } from '@/shared/rules/melody/voice-compass'
import type { AnyRule } from '@/shared/rules/rule'

/** Rules of a single line, in the order of the catalogue. */
export const MELODY_RULES: readonly AnyRule[] = [
  cfLength,
  cfNoteValues,
  cfStartFinal,
  cfEndFinal,
  cfApproachFinal,
  cfRange,
  melSingleClimax,
  melClimaxPlace,
  melIntervalSet,
  melSixthLeap,
  melSeventh,
  melAugDim,
  melChromaticStep,
  melLeapRecovery,
  melLeapApproach,
  melLeapRun,
  melLeapsSameDirection,
  melTwoLeapSpan,
  melTritoneOutline,
  melSeventhOutline,
  melStepMajority,
  melSomeLeaps,
  melRunOneDirection,
  melNoRepeatCf,
  melMotiveRepeat,
  melSequence,
  melCircling,
  melLeadingTone,
  melMinorDegrees,
  cfDiatonic,
  melLeapOrder,
  melTriadOutline,
  melArch,
  voiceCompass,
]

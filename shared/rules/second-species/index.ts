import type { AnyRule } from '@/shared/rules/rule'
import { s2AfterbeatPerfects } from '@/shared/rules/second-species/s2-afterbeat-perfects'
import { s2BarlineParallels } from '@/shared/rules/second-species/s2-barline-parallels'
import { s2CadenceAbove } from '@/shared/rules/second-species/s2-cadence-above'
import { s2CadenceBelow } from '@/shared/rules/second-species/s2-cadence-below'
import { s2Cambiata } from '@/shared/rules/second-species/s2-cambiata'
import { s2ChordRun } from '@/shared/rules/second-species/s2-chord-run'
import { s2DirectDownbeats } from '@/shared/rules/second-species/s2-direct-downbeats'
import { s2DownbeatConsonant } from '@/shared/rules/second-species/s2-downbeat-consonant'
import { s2DownbeatOutline } from '@/shared/rules/second-species/s2-downbeat-outline'
import { s2DownbeatPerfects } from '@/shared/rules/second-species/s2-downbeat-perfects'
import { s2LeapInBar } from '@/shared/rules/second-species/s2-leap-in-bar'
import { s2Neighbour } from '@/shared/rules/second-species/s2-neighbour'
import { s2OpenInterval } from '@/shared/rules/second-species/s2-open-interval'
import { s2OpenRest } from '@/shared/rules/second-species/s2-open-rest'
import { s2PenultDegrees } from '@/shared/rules/second-species/s2-penult-degrees'
import { s2Repeat } from '@/shared/rules/second-species/s2-repeat'
import { s2Rhythm } from '@/shared/rules/second-species/s2-rhythm'
import { s2SecondaryPeaks } from '@/shared/rules/second-species/s2-secondary-peaks'
import { s2SixthLeap } from '@/shared/rules/second-species/s2-sixth-leap'
import { s2Unison } from '@/shared/rules/second-species/s2-unison'
import { s2UpbeatConsonantPatterns } from '@/shared/rules/second-species/s2-upbeat-consonant-patterns'
import { s2UpbeatPassing } from '@/shared/rules/second-species/s2-upbeat-passing'

/** Rules of two voices in second species, in the order of the catalogue. */
export const SECOND_SPECIES_RULES: readonly AnyRule[] = [
  s2Rhythm,
  s2OpenRest,
  s2OpenInterval,
  s2DownbeatConsonant,
  s2UpbeatPassing,
  s2Neighbour,
  s2Cambiata,
  s2UpbeatConsonantPatterns,
  s2Repeat,
  s2Unison,
  s2DownbeatPerfects,
  s2AfterbeatPerfects,
  s2BarlineParallels,
  s2DirectDownbeats,
  s2DownbeatOutline,
  s2LeapInBar,
  s2SixthLeap,
  s2CadenceAbove,
  s2CadenceBelow,
  s2PenultDegrees,
  s2SecondaryPeaks,
  s2ChordRun,
]

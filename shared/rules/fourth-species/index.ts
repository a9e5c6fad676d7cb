import { s498Preparation } from '@/shared/rules/fourth-species/s4-98-preparation'
import { s4AfterbeatPerfects } from '@/shared/rules/fourth-species/s4-afterbeat-perfects'
import { s4Break } from '@/shared/rules/fourth-species/s4-break'
import { s4CadenceAbove } from '@/shared/rules/fourth-species/s4-cadence-above'
import { s4CadenceBelow } from '@/shared/rules/fourth-species/s4-cadence-below'
import { s4ChainLimit } from '@/shared/rules/fourth-species/s4-chain-limit'
import { s4ConsonantTie } from '@/shared/rules/fourth-species/s4-consonant-tie'
import { s4Open } from '@/shared/rules/fourth-species/s4-open'
import { s4PerfectChain } from '@/shared/rules/fourth-species/s4-perfect-chain'
import { s4Resolve } from '@/shared/rules/fourth-species/s4-resolve'
import { s4Retardation } from '@/shared/rules/fourth-species/s4-retardation'
import { s4Rhythm } from '@/shared/rules/fourth-species/s4-rhythm'
import { s4SetAbove } from '@/shared/rules/fourth-species/s4-set-above'
import { s4SetBelow } from '@/shared/rules/fourth-species/s4-set-below'
import { s4ShapeRelaxed } from '@/shared/rules/fourth-species/s4-shape-relaxed'
import { s4StripTest } from '@/shared/rules/fourth-species/s4-strip-test'
import { s4SuspensionQuota } from '@/shared/rules/fourth-species/s4-suspension-quota'
import { s4UpbeatConsonant } from '@/shared/rules/fourth-species/s4-upbeat-consonant'
import type { AnyRule } from '@/shared/rules/rule'

/** Rules of two voices in fourth species, in the order of the catalogue. */
export const FOURTH_SPECIES_RULES: readonly AnyRule[] = [
  s4Rhythm,
  s4Open,
  s4UpbeatConsonant,
  s4Resolve,
  s4SetAbove,
  s4SetBelow,
  s4ConsonantTie,
  s4ChainLimit,
  s4PerfectChain,
  s498Preparation,
  s4StripTest,
  s4AfterbeatPerfects,
  s4Break,
  s4SuspensionQuota,
  s4CadenceAbove,
  s4CadenceBelow,
  s4ShapeRelaxed,
  s4Retardation,
]

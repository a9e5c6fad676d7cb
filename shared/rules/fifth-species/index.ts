import { s5Anticipation } from '@/shared/rules/fifth-species/s5-anticipation'
import { s5Close } from '@/shared/rules/fifth-species/s5-close'
import { s5ConsonantTieEarly } from '@/shared/rules/fifth-species/s5-consonant-tie-early'
import { s5DottedHalf } from '@/shared/rules/fifth-species/s5-dotted-half'
import { s5EighthCount } from '@/shared/rules/fifth-species/s5-eighth-count'
import { s5EighthFigure } from '@/shared/rules/fifth-species/s5-eighth-figure'
import { s5EighthPlace } from '@/shared/rules/fifth-species/s5-eighth-place'
import { s5EighthStep } from '@/shared/rules/fifth-species/s5-eighth-step'
import { s5Mix } from '@/shared/rules/fifth-species/s5-mix'
import { s5Open } from '@/shared/rules/fifth-species/s5-open'
import { s5OrnamentLeap } from '@/shared/rules/fifth-species/s5-ornament-leap'
import { s5OrnamentedResolution } from '@/shared/rules/fifth-species/s5-ornamented-resolution'
import { s5QuarterHalfQuarter } from '@/shared/rules/fifth-species/s5-quarter-half-quarter'
import { s5QuarterQuarterHalf } from '@/shared/rules/fifth-species/s5-quarter-quarter-half'
import { s5TieValue } from '@/shared/rules/fifth-species/s5-tie-value'
import { s5ValueRun } from '@/shared/rules/fifth-species/s5-value-run'
import { s5WholeInside } from '@/shared/rules/fifth-species/s5-whole-inside'
import type { AnyRule } from '@/shared/rules/rule'

/** Rules of two voices in fifth species, in the order of the catalogue. */
export const FIFTH_SPECIES_RULES: readonly AnyRule[] = [
  s5Mix,
  s5Open,
  s5Close,
  s5ValueRun,
  s5WholeInside,
  s5EighthPlace,
  s5EighthStep,
  s5EighthCount,
  s5EighthFigure,
  s5OrnamentedResolution,
  s5OrnamentLeap,
  s5Anticipation,
  s5QuarterQuarterHalf,
  s5QuarterHalfQuarter,
  s5DottedHalf,
  s5TieValue,
  s5ConsonantTieEarly,
]

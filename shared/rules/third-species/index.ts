import type { AnyRule } from '@/shared/rules/rule'
import { s3Barline } from '@/shared/rules/third-species/s3-barline'
import { s3BarlineStep } from '@/shared/rules/third-species/s3-barline-step'
import { s3Beat3Perfects } from '@/shared/rules/third-species/s3-beat3-perfects'
import { s3CadenceAbove } from '@/shared/rules/third-species/s3-cadence-above'
import { s3CadenceBelow } from '@/shared/rules/third-species/s3-cadence-below'
import { s3Cambiata } from '@/shared/rules/third-species/s3-cambiata'
import { s3ClimaxStrong } from '@/shared/rules/third-species/s3-climax-strong'
import { s3DissonanceStep } from '@/shared/rules/third-species/s3-dissonance-step'
import { s3DoubleNeighbour } from '@/shared/rules/third-species/s3-double-neighbour'
import { s3DoublePassing } from '@/shared/rules/third-species/s3-double-passing'
import { s3DownbeatPerfects } from '@/shared/rules/third-species/s3-downbeat-perfects'
import { s3FigureRepeat } from '@/shared/rules/third-species/s3-figure-repeat'
import { s3FirstConsonant } from '@/shared/rules/third-species/s3-first-consonant'
import { s3ImperfectRun } from '@/shared/rules/third-species/s3-imperfect-run'
import { s3LeapFlank } from '@/shared/rules/third-species/s3-leap-flank'
import { s3LeapUpAccent } from '@/shared/rules/third-species/s3-leap-up-accent'
import { s3Neighbour } from '@/shared/rules/third-species/s3-neighbour'
import { s3Open } from '@/shared/rules/third-species/s3-open'
import { s3ParallelWindow } from '@/shared/rules/third-species/s3-parallel-window'
import { s3Repeat } from '@/shared/rules/third-species/s3-repeat'
import { s3Rhythm } from '@/shared/rules/third-species/s3-rhythm'
import { s3ScaleTritone } from '@/shared/rules/third-species/s3-scale-tritone'
import { s3ThirdQuarter } from '@/shared/rules/third-species/s3-third-quarter'
import { s3Unison } from '@/shared/rules/third-species/s3-unison'

/** Rules of two voices in third species, in the order of the catalogue. */
export const THIRD_SPECIES_RULES: readonly AnyRule[] = [
  s3Rhythm,
  s3Open,
  s3FirstConsonant,
  s3ThirdQuarter,
  s3DissonanceStep,
  s3Neighbour,
  s3DoubleNeighbour,
  s3Cambiata,
  s3DoublePassing,
  s3Barline,
  s3BarlineStep,
  s3ParallelWindow,
  s3DownbeatPerfects,
  s3Beat3Perfects,
  s3ImperfectRun,
  s3Unison,
  s3Repeat,
  s3LeapUpAccent,
  s3LeapFlank,
  s3FigureRepeat,
  s3ScaleTritone,
  s3ClimaxStrong,
  s3CadenceAbove,
  s3CadenceBelow,
]

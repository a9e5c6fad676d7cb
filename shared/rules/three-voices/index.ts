import type { AnyRule } from '@/shared/rules/rule'
import { v3AllSameDirection } from '@/shared/rules/three-voices/v3-all-same-direction'
import { v3BassConsonance } from '@/shared/rules/three-voices/v3-bass-consonance'
import { v3Close } from '@/shared/rules/three-voices/v3-close'
import { v3CompleteTriad } from '@/shared/rules/three-voices/v3-complete-triad'
import { v3DiminishedTriad } from '@/shared/rules/three-voices/v3-diminished-triad'
import { v3DirectRelaxed } from '@/shared/rules/three-voices/v3-direct-relaxed'
import { v3Doubling } from '@/shared/rules/three-voices/v3-doubling'
import { v3Open } from '@/shared/rules/three-voices/v3-open'
import { v3ParallelsAllPairs } from '@/shared/rules/three-voices/v3-parallels-all-pairs'
import { v3SixFour } from '@/shared/rules/three-voices/v3-six-four'
import { v3Spacing } from '@/shared/rules/three-voices/v3-spacing'
import { v3Unison } from '@/shared/rules/three-voices/v3-unison'
import { v3UpperFourth } from '@/shared/rules/three-voices/v3-upper-fourth'

/** Rules of three voices, note against note, in the order of the catalogue. */
export const THREE_VOICE_RULES: readonly AnyRule[] = [
  v3BassConsonance,
  v3UpperFourth,
  v3SixFour,
  v3DiminishedTriad,
  v3CompleteTriad,
  v3Doubling,
  v3Unison,
  v3ParallelsAllPairs,
  v3DirectRelaxed,
  v3AllSameDirection,
  v3Open,
  v3Close,
  v3Spacing,
]

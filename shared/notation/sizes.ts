import type { ScoreSize } from '@/shared/notation/score-layout'

/** Lettering of a score in px, for a staff space. Small staves keep legible words. */
export type Lettering = Readonly<{
  numberPx: number
  figurePx: number
  countPx: number
  labelPx: number
  bracketPx: number
}>

export const letteringOf = (spacePx: number): Lettering => ({
  numberPx: Math.max(13, Math.round(1.35 * spacePx)),
  figurePx: Math.max(16, Math.round(1.6 * spacePx)),
  countPx: Math.max(12, Math.round(1.1 * spacePx)),
  labelPx: Math.max(12, Math.round(1.15 * spacePx)),
  bracketPx: Math.max(14, Math.round(1.35 * spacePx)),
})

/** Figures of later moments in a bar are smaller than those of its first. */
export const figurePxOf = (spacePx: number, isWeak: boolean): number => {
  const { figurePx } = letteringOf(spacePx)
  return isWeak ? Math.max(13, Math.round(0.75 * figurePx)) : figurePx
}

/** Width a bar asks for, in staff spaces, by how it stands; bars in play are wider than the rest. */
export type BarWeights = Readonly<{ frozen: number; plain: number; released: number }>

type SizeFacts = Readonly<{
  weights: BarWeights
  /** A bar is never stretched past this many times its weight; null where the music fills the width. */
  maxStretch: number | null
  /** Least distance between the staves, in staff spaces. */
  staffGap: number
  /** Whole px, so that staff lines are crisp. */
  spaceFor: (widthPx: number) => number
  /** Where the height is known: up to this many times larger while few bars leave room for it. */
  mostGrowth: number
  /** Below this many px to a staff space the music is no longer shrunk. */
  leastSpacePx: number
}>

const within = (value: number, least: number, most: number): number => Math.min(most, Math.max(least, value))

export const SIZE_FACTS: Readonly<Record<ScoreSize, SizeFacts>> = {
  wall: {
    weights: { frozen: 4.4, plain: 5, released: 7.7 },
    maxStretch: null,
    staffGap: 6.5,
    spaceFor: (widthPx) => Math.round(within(widthPx / 60, 8, 64)),
    mostGrowth: 1.6,
    leastSpacePx: 8,
  },
  page: {
    weights: { frozen: 4.4, plain: 5, released: 7.7 },
    maxStretch: 2.6,
    staffGap: 5.7,
    spaceFor: (widthPx) => Math.round(within(6.8 + widthPx / 220, 8, 16)),
    mostGrowth: 1,
    leastSpacePx: 6,
  },
  strip: {
    weights: { frozen: 6.6, plain: 7.6, released: 9.2 },
    maxStretch: null,
    staffGap: 5.6,
    spaceFor: (widthPx) => Math.round(within(8.6 + widthPx / 280, 10, 14)),
    mostGrowth: 1,
    leastSpacePx: 6,
  },
  mini: {
    weights: { frozen: 4, plain: 4, released: 4 },
    maxStretch: 2.6,
    staffGap: 0,
    spaceFor: () => 7,
    mostGrowth: 1,
    leastSpacePx: 4,
  },
}

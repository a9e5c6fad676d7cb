import { fonts, type Pigments } from '@/components/theme'
import type { Ink } from '@/shared/notation/mark'
import type { FaceName } from '@/shared/notation/text-widths'

/** Colour of a ground under a thin wash of another: `#F2F4F0` under a tenth of minium. Both are `#RRGGBB`. */
export function washed(ground: string, wash: string, opacity: number): string {
  const channel = (from: number): string => {
    const [below, above] = [ground, wash].map((hex) => Number.parseInt(hex.slice(from, from + 2), 16))
    const mixed = Math.round((below ?? 0) * (1 - opacity) + (above ?? 0) * opacity)
    return mixed.toString(16).padStart(2, '0')
  }
  return `#${channel(1)}${channel(3)}${channel(5)}`
}

/**
 * The colour a mark is drawn in. What stands back behind the notes is mixed with the page beforehand, as thin ink would
 * show twice where lines cross.
 */
export function colorOf(ink: Ink, colors: Pigments): string {
  switch (ink) {
    case 'cantus':
      return colors.lampblack
    case 'line':
      return colors.azurite
    case 'breach':
      return colors.minium
    case 'remark':
      return colors.orpiment
    case 'quiet':
      return colors.lead
    case 'released':
      return colors.verdigris
    case 'staff':
      return washed(colors.vellum, colors.lampblack, 0.6)
    case 'barline':
      return washed(colors.vellum, colors.lampblack, 0.75)
    case 'hatch':
      return washed(colors.vellum, colors.lead, 0.6)
  }
}

export const familyOf = (face: FaceName): string => fonts[face]

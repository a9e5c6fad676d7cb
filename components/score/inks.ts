import { fonts, type Pigments } from '@/components/theme'
import type { Ink } from '@/shared/notation/mark'
import type { FaceName } from '@/shared/notation/text-widths'

/** A pigment, and how thick it lies: staff lines stand back behind the notes. */
export type Pigmented = Readonly<{ color: string; opacity: number }>

export function inkOf(ink: Ink, colors: Pigments): Pigmented {
  switch (ink) {
    case 'cantus':
      return { color: colors.lampblack, opacity: 1 }
    case 'line':
      return { color: colors.azurite, opacity: 1 }
    case 'breach':
      return { color: colors.minium, opacity: 1 }
    case 'remark':
      return { color: colors.orpiment, opacity: 1 }
    case 'quiet':
      return { color: colors.lead, opacity: 1 }
    case 'released':
      return { color: colors.verdigris, opacity: 1 }
    case 'staff':
      return { color: colors.lampblack, opacity: 0.6 }
    case 'barline':
      return { color: colors.lampblack, opacity: 0.75 }
    case 'hatch':
      return { color: colors.lead, opacity: 0.6 }
  }
}

export const familyOf = (face: FaceName): string => fonts[face]

/** Colour of a ground under a thin wash of another: `#F2F4F0` under a tenth of minium. Both are `#RRGGBB`. */
export function washed(ground: string, wash: string, opacity: number): string {
  const channel = (from: number): string => {
    const [below, above] = [ground, wash].map((hex) => Number.parseInt(hex.slice(from, from + 2), 16))
    const mixed = Math.round((below ?? 0) * (1 - opacity) + (above ?? 0) * opacity)
    return mixed.toString(16).padStart(2, '0')
  }
  return `#${channel(1)}${channel(3)}${channel(5)}`
}

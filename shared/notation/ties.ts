import { crescentMark, type Ink, type Mark } from '@/shared/notation/mark'
import { letteringOf } from '@/shared/notation/sizes'
import { depthStaffSpaces } from '@/shared/notation/staff-place'

/*
 * Ties as Gould, Behind Bars, has them (from memory): on the side of the heads away from their stems, from head to head, flat
 * and even, thick in the middle; a tie into nothing seen is a short one that lets the note sound.
 */

/** Where a tie begins or ends by a head: `y` in px below the top staff line. */
export type TieEnd = Readonly<{ y: number; isAbove: boolean; ink: Ink }>

const GAP = 0.16
const CLEAR_OF_DOT = 1
const BOW_SHARE = 0.11
const LEAST_BOW = 0.32
/** Ties stay within this many staff spaces of the middle of their head. */
const MOST_BOW = 0.8
const THICKNESS = 0.22
/** Length of a tie that ends at no head. */
const OPEN_LENGTH = 1.7

type Head = Readonly<{
  place: number
  /** Whether its stem goes up, or would. */
  isUp: boolean
  /** Half the height of the head. */
  halfPx: number
  isDotted: boolean
  hasCount: boolean
  ink: Ink
}>

export function tieEnd({ place, isUp, halfPx, isDotted, hasCount, ink }: Head, spacePx: number): TieEnd {
  const isAbove = !isUp
  const isDotInWay = isDotted && isAbove && place % 2 === 0
  const countPx = hasCount ? 0.45 * letteringOf(spacePx).countPx + 1 : 0
  const clear = Math.max(halfPx + GAP * spacePx, isDotInWay ? CLEAR_OF_DOT * spacePx : 0, countPx)
  const y = depthStaffSpaces(place) * spacePx
  return { y: isAbove ? y - clear : y + clear, isAbove, ink }
}

/** The tie from one x to another. */
export function tieMark(end: TieEnd, fromX: number, toX: number, spacePx: number, group: string): Mark {
  const bow = Math.min(Math.max((toX - fromX) * BOW_SHARE, LEAST_BOW * spacePx), MOST_BOW * spacePx)
  const name = { role: 'tie', ink: end.ink, group } as const
  return crescentMark(name, [fromX, end.y], [toX, end.y], end.isAbove ? bow : -bow, THICKNESS * spacePx)
}

/** A tie keeps clear of both its heads. */
export function tieBetween(from: TieEnd, to: TieEnd | null): TieEnd {
  if (!to || to.isAbove !== from.isAbove) return from
  return { ...from, y: from.isAbove ? Math.min(from.y, to.y) : Math.max(from.y, to.y) }
}

/** Where a stem is in the way of a tie's end, it stops short of the head by this much. */
export const stoppingShortPx = (from: TieEnd, to: TieEnd | null, spacePx: number): number =>
  to && to.isAbove !== from.isAbove ? 0.95 * spacePx : 0

/** The tie of a note whose other end is not seen, from a head on x = 0. */
export const openTieMark = (end: TieEnd, spacePx: number, group: string): Mark =>
  tieMark(end, 0.2 * spacePx, (0.2 + OPEN_LENGTH) * spacePx, spacePx, group)

/** The farthest a tie may reach from its ends, as y in px: for keeping the height of a row. */
export const tieReachPx = ({ y, isAbove }: TieEnd, spacePx: number): number =>
  isAbove ? y - MOST_BOW * spacePx : y + MOST_BOW * spacePx

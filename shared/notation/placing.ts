import { growBox, isOverlapping, moveBox, uniteBoxes, type Box } from '@/shared/notation/box'
import type { Mark, MarkRole } from '@/shared/notation/mark'

/**
 * What each role may touch of other groups. Ledger lines may run behind any head or stem of the same column, as in a
 * chord; words and accidentals they may not. A beam lies on its stems, and a tie goes over bar lines and under beams.
 */
const MAY_TOUCH: Partial<Readonly<Record<MarkRole, readonly MarkRole[]>>> = {
  ledger: ['ledger', 'notehead', 'lozenge', 'stem', 'flag', 'tie'],
  beam: ['stem'],
  tie: ['barline'],
}

const mayTouch = (a: Mark, b: Mark): boolean =>
  a.group === b.group || MAY_TOUCH[a.role]?.includes(b.role) || MAY_TOUCH[b.role]?.includes(a.role) || false

type Lozenge = Extract<Mark, { kind: 'polygon' }>

const isLozenge = (mark: Mark): mark is Lozenge => mark.kind === 'polygon' && mark.role !== 'beam'

/**
 * How far to the right the first of two lozenges must go to stand clear of the other. Lozenges of one shape meet where
 * the lozenge of their added sizes does, so that two a step apart nest along their slanted sides.
 */
function lozengePush(moving: Box, still: Box): number {
  const dx = (moving.left + moving.right - still.left - still.right) / 2
  const dy = Math.abs(moving.top + moving.bottom - still.top - still.bottom) / 2
  const halfHeight = (moving.bottom - moving.top + still.bottom - still.top) / 2
  const halfWidth = (moving.right - moving.left + still.right - still.left) / 2
  const needed = dy >= halfHeight ? 0 : halfWidth * (1 - dy / halfHeight)
  return Math.abs(dx) >= needed ? 0 : needed - dx
}

/** How far to the right a mark, with its box grown or moved, must go to stand clear of another; 0 when it does. */
function pushRight(moving: Mark, box: Box, still: Mark): number {
  if (!isOverlapping(box, still.box) || mayTouch(moving, still)) return 0
  if (isLozenge(moving) && isLozenge(still)) return lozengePush(box, still.box)
  return still.box.right - box.left
}

/** Whether two marks of the score stand in each other's way. */
export const isColliding = (a: Mark, b: Mark): boolean => pushRight(a, a.box, b) > 0

const HAIR_PX = 0.01

/** Two lozenges may nest closely; numbers, accidentals and noteheads want air beside them. */
export type Clearance = Readonly<{ nestedPx: number; besidePx: number }>

/**
 * How far marks that belong together have to move to the right to be clear of those already standing, as the second of
 * two notes a step apart is moved in a chord.
 */
export function clearingPx(marks: readonly Mark[], standing: readonly Mark[], clearance: Clearance): number {
  if (standing.length === 0) return 0
  const { nestedPx, besidePx } = clearance
  const nested = marks.map((mark) => growBox(mark.box, nestedPx))
  const beside = nested.map((box) => ({
    ...box,
    left: box.left + nestedPx - besidePx,
    right: box.right - nestedPx + besidePx,
  }))
  let dx = 0
  for (;;) {
    let push = 0
    marks.forEach((mark, i) => {
      const nestedBox = moveBox(nested[i] as Box, dx, 0)
      const besideBox = moveBox(beside[i] as Box, dx, 0)
      for (const other of standing) {
        const box = isLozenge(mark) && isLozenge(other) ? nestedBox : besideBox
        push = Math.max(push, pushRight(mark, box, other))
      }
    })
    if (push === 0) return dx
    dx += push + HAIR_PX
  }
}

export const boxOf = (marks: readonly Mark[]): Box | null =>
  marks.length === 0 ? null : uniteBoxes(marks.map((mark) => mark.box))

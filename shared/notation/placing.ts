import { growBox, isOverlapping, moveBox, uniteBoxes } from '@/shared/notation/box'
import { moveMark, type Mark, type MarkRole } from '@/shared/notation/mark'

const CROSSED_BY_LEDGERS: readonly MarkRole[] = ['ledger', 'notehead', 'lozenge']

/** Ledger lines may run behind any head of the same column, as in a chord; words and accidentals they may not touch. */
const mayTouch = (a: Mark, b: Mark): boolean =>
  a.group === b.group ||
  (a.role === 'ledger' && CROSSED_BY_LEDGERS.includes(b.role)) ||
  (b.role === 'ledger' && CROSSED_BY_LEDGERS.includes(a.role))

/** Whether two marks of the score stand in each other's way. */
export const isColliding = (a: Mark, b: Mark): boolean => !mayTouch(a, b) && isOverlapping(a.box, b.box)

/**
 * Moves marks that belong together to the right until they are clear of those already standing, as the second of two
 * notes a step apart is moved in a chord. Returns them where they come to stand.
 */
export function placeClear(
  marks: readonly Mark[],
  standing: readonly Mark[],
  clearancePx: number,
): readonly Mark[] {
  let dx = 0
  for (;;) {
    let push = 0
    for (const mark of marks) {
      const grown = { ...mark, box: growBox(moveBox(mark.box, dx, 0), clearancePx) }
      for (const other of standing)
        if (isColliding(grown, other)) push = Math.max(push, other.box.right - grown.box.left)
    }
    if (push === 0) return dx === 0 ? marks : marks.map((mark) => moveMark(mark, dx, 0))
    dx += push + 0.01
  }
}

export const boxOf = (marks: readonly Mark[]) =>
  marks.length === 0 ? null : uniteBoxes(marks.map((m) => m.box))

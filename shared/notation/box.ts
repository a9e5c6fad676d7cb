/** A rectangle in px, y downwards. */
export type Box = Readonly<{ left: number; top: number; right: number; bottom: number }>

/** True when two boxes share more than an edge. */
export const isOverlapping = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom

export const moveBox = (box: Box, dx: number, dy: number): Box => ({
  left: box.left + dx,
  top: box.top + dy,
  right: box.right + dx,
  bottom: box.bottom + dy,
})

export const growBox = (box: Box, by: number): Box => ({
  left: box.left - by,
  top: box.top - by,
  right: box.right + by,
  bottom: box.bottom + by,
})

/** The least box around all of them; there must be one. */
export function uniteBoxes(boxes: readonly Box[]): Box {
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const box of boxes) {
    left = Math.min(left, box.left)
    top = Math.min(top, box.top)
    right = Math.max(right, box.right)
    bottom = Math.max(bottom, box.bottom)
  }
  return { left, top, right, bottom }
}

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

export const uniteBoxes = (boxes: readonly Box[]): Box =>
  boxes.reduce((all, box) => ({
    left: Math.min(all.left, box.left),
    top: Math.min(all.top, box.top),
    right: Math.max(all.right, box.right),
    bottom: Math.max(all.bottom, box.bottom),
  }))

export const isInside = (box: Box, x: number, y: number): boolean =>
  x >= box.left && x < box.right && y >= box.top && y < box.bottom

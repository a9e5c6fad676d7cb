/**
 * A place that is slid to rather than jumped to: a transform with a transition, which the browser eases without drawing
 * anew. For drawn shapes and for views alike; web styles that the native types do not know.
 */
export function easedTransform(xPx: number, yPx: number, easeMs: number): object {
  return {
    style: {
      transform: `translate(${xPx}px, ${yPx}px)`,
      ...(easeMs > 0
        ? {
            transitionProperty: 'transform',
            transitionDuration: `${easeMs}ms`,
            transitionTimingFunction: 'ease-out',
          }
        : null),
    },
  }
}

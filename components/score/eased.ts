/**
 * A place that is slid to rather than jumped to: a transform with a transition, which the browser eases without drawing
 * anew. For shapes of react-native-svg and for views alike; web styles that the native types do not know.
 */
export function easedTransform(xPx: number, yPx: number, easeMs: number): object {
  return {
    style: {
      transform: [{ translateX: xPx }, { translateY: yPx }],
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

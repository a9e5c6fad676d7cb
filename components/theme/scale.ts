/** The shipped families; each names one cut, so no style sets a weight. The stand-ins are scaled to the same width. */
const serif = (family: string) => `${family}, "Alegreya Stand-in", serif`
const sans = (family: string) => `${family}, "Alegreya Sans Stand-in", sans-serif`
export const fonts = {
  Alegreya: serif('Alegreya'),
  AlegreyaItalic: serif('AlegreyaItalic'),
  AlegreyaMedium: serif('AlegreyaMedium'),
  AlegreyaSans: sans('AlegreyaSans'),
  AlegreyaSansMedium: sans('AlegreyaSansMedium'),
  AlegreyaSansBold: sans('AlegreyaSansBold'),
} as const

/** Sizes of type in pixels; the wall uses the top three. */
export const type = { small: 13, note: 15, text: 17, title: 21, large: 27, head: 35, wall: 56 } as const

/** Line height that goes with each size: 1.35 for prose, tighter for what stands alone. */
export const leading = { small: 18, note: 20, text: 23, title: 28, large: 34, head: 40, wall: 61 } as const

export const space = {
  hair: 2,
  tiny: 4,
  small: 8,
  half: 12,
  one: 16,
  wide: 24,
  double: 32,
  triple: 48,
} as const

export const TOUCH_TARGET_PX = 44
export const CORNER_PX = 3
export const RULE_PX = 1.5
/** Width from which a screen lays things side by side. */
export const WIDE_PX = 900
/** Widest measure of prose and forms. */
export const MEASURE_PX = 620
export const MOTION_MS = 160

/** Clefs the engraver knows. `treble-8vb` is the treble clef with a small 8 below, for tenors. */
export const CLEFS = ['treble', 'treble-8vb', 'alto', 'tenor', 'bass'] as const
export type Clef = (typeof CLEFS)[number]

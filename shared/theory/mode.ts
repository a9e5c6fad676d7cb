/** The six modes of the species tradition. Any of them may stand on any final. */
export const MODES = ['ionian', 'dorian', 'phrygian', 'lydian', 'mixolydian', 'aeolian'] as const
export type Mode = (typeof MODES)[number]

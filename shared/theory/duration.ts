/** Time in a score is counted in whole ticks, 480 to the quarter note, as MIDI files commonly do. */
export const QUARTER_TICKS = 480
export const WHOLE_TICKS = 4 * QUARTER_TICKS
export const HALF_TICKS = 2 * QUARTER_TICKS

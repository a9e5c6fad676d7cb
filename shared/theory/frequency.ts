import { chromaticNumber, type Pitch } from '@/shared/theory/pitch'

/** Standard tuning frequency of A4 (ISO 16:1975). */
export const A4_HERTZ = 440
const A4_MIDI = 69

/** MIDI note number: 60 for C4, 69 for A4. */
export const midiNumber = (pitch: Pitch): number => chromaticNumber(pitch) + 12

/** Frequency in equal temperament: A4 is 440 Hz, every semitone the twelfth root of two. */
export const frequencyHertz = (pitch: Pitch): number => A4_HERTZ * 2 ** ((midiNumber(pitch) - A4_MIDI) / 12)

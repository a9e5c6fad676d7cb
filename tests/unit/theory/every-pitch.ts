import { LETTERS, type Alteration, type Pitch } from '@/shared/theory/pitch'

const ALTERATIONS: readonly Alteration[] = [-2, -1, 0, 1, 2]

/** Every spelled pitch of four octaves, C♭♭2 to B♯♯5: 140 of them. */
export const EVERY_PITCH: readonly Pitch[] = [2, 3, 4, 5].flatMap((octave) =>
  LETTERS.flatMap((letter) => ALTERATIONS.map((alteration) => ({ letter, alteration, octave }))),
)

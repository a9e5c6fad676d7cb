import type { Chord } from '@/shared/rules/three-voices/chord'

/** A sixth and a perfect fourth over the bass. */
export const isSixFour = ({ overBass }: Chord): boolean =>
  overBass.some(({ steps, semitones }) => steps === 3 && semitones === 5) &&
  overBass.some(({ steps }) => steps === 5)

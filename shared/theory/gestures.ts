import { comparePitches, type Pitch } from '@/shared/theory/pitch'

/** Fewest notes of a gesture. Common practice, no source. */
export const LEAST_GESTURE_BARS = 3

/** A span of bars that hangs together by its contour, from and to included, 1-based. */
export type Gesture = Readonly<{
  from: number
  to: number
  shape: 'rise' | 'fall' | 'arch' | 'valley' | 'level'
}>

/**
 * Cuts a melody into gestures: each runs to the next low turning point, so that a rise and the fall after it stay
 * together. Spans that would be shorter than three bars join their neighbour. Fux's Dorian cantus, D F E D G F A G F E
 * D, gives bars 1–4 and 5–11. A suggestion, not a judgement.
 */
export function findGestures(cantus: readonly Pitch[]): readonly Gesture[] {
  if (cantus.length < LEAST_GESTURE_BARS) return []
  const ends: number[] = []
  let from = 1
  for (const bar of [...findValleys(cantus), cantus.length]) {
    if (bar - from + 1 < LEAST_GESTURE_BARS) continue
    ends.push(bar)
    from = bar + 1
  }
  // What is left at the end is too short to stand alone.
  if (from <= cantus.length) ends[Math.max(0, ends.length - 1)] = cantus.length
  return ends.map((to, index) => {
    const start = index === 0 ? 1 : (ends[index - 1] as number) + 1
    return { from: start, to, shape: shapeOf(cantus.slice(start - 1, to)) }
  })
}

/** Bars inside the melody at which it has come down and goes up again; of a repeated note the last. */
function findValleys(cantus: readonly Pitch[]): readonly number[] {
  const valleys: number[] = []
  let direction = 0
  for (let index = 1; index < cantus.length; index += 1) {
    const move = comparePitches(cantus[index] as Pitch, cantus[index - 1] as Pitch)
    if (move > 0 && direction < 0) valleys.push(index)
    if (move !== 0) direction = move
  }
  return valleys
}

function shapeOf(notes: readonly Pitch[]): Gesture['shape'] {
  const first = notes[0] as Pitch
  const last = notes.at(-1) as Pitch
  const inside = notes.slice(1, -1)
  const isAbove = inside.some((note) => comparePitches(note, first) > 0 && comparePitches(note, last) > 0)
  const isBelow = inside.some((note) => comparePitches(note, first) < 0 && comparePitches(note, last) < 0)
  if (isAbove) return 'arch'
  if (isBelow) return 'valley'
  const move = comparePitches(last, first)
  return move > 0 ? 'rise' : move < 0 ? 'fall' : 'level'
}

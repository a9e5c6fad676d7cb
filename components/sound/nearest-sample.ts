/** Which recording stands in for a note, and how much faster or slower it is run to sound at that pitch. */
export type Stand = Readonly<{ sampleMidi: number; playbackRate: number }>

/**
 * The recording nearest to `midi`; of two equally near the lower one, since a recording sped up keeps its brightness.
 * @example nearestSample([65, 69], 67) // { sampleMidi: 65, playbackRate: 1.122… }
 */
export function nearestSample(sampleMidis: readonly number[], midi: number): Stand {
  const [first, ...others] = sampleMidis
  if (first === undefined) throw new RangeError('The piano has no recordings.')
  const sampleMidi = others.reduce((best, next) => {
    const gain = Math.abs(best - midi) - Math.abs(next - midi)
    return gain > 0 || (gain === 0 && next < best) ? next : best
  }, first)
  return { sampleMidi, playbackRate: 2 ** ((midi - sampleMidi) / 12) }
}

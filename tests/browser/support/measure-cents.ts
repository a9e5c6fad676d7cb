/** Strength of one frequency in a recording, by Goertzel's recurrence. */
function strengthAt(samples: Float64Array, rateHz: number, hertz: number): number {
  const coefficient = 2 * Math.cos((2 * Math.PI * hertz) / rateHz)
  let last = 0
  let lastButOne = 0
  for (let i = 0; i < samples.length; i += 1) {
    const next = (samples[i] as number) + coefficient * last - lastButOne
    lastButOne = last
    last = next
  }
  return Math.sqrt(Math.max(0, last ** 2 + lastButOne ** 2 - coefficient * last * lastButOne))
}

/** Hann's window, so that a frequency does not smear over its neighbours. */
const fadeEnds = (samples: Float32Array): Float64Array =>
  Float64Array.from(
    samples,
    (sample, i) => sample * (0.5 - 0.5 * Math.cos((2 * Math.PI * i) / samples.length)),
  )

/**
 * How many cents the strongest partial near `hertz` lies above it, looked for within a semitone, to a quarter of a cent.
 * The answer is `null` where nothing there stands out from its surroundings: silence, or another note altogether.
 */
export function measureCents(samples: Float32Array, rateHz: number, hertz: number): number | null {
  const faded = fadeEnds(samples)
  const at = (cents: number): number => strengthAt(faded, rateHz, hertz * 2 ** (cents / 1200))
  const strongest = (from: number, to: number, step: number): number => {
    let [best, most] = [from, at(from)]
    for (let cents = from + step; cents <= to; cents += step) {
      const strength = at(cents)
      if (strength > most) [best, most] = [cents, strength]
    }
    return best
  }
  const coarse = strongest(-100, 100, 4)
  const fine = strongest(coarse - 4, coarse + 4, 0.25)
  return at(fine) > 4 * (at(-350) + at(350)) ? fine : null
}

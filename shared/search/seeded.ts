/** Whole numbers below a bound, evenly, from a seed: the same seed gives the same numbers on every machine. */
export type Seeded = Readonly<{ below: (bound: bigint) => bigint }>

/** Chris Doty-Humphrey's small fast counting generator (sfc32, PractRand), seeded by SplitMix32. */
export function createSeeded(seed: number): Seeded {
  let mixed = seed | 0
  const mix = (): number => {
    mixed = (mixed + 0x9e3779b9) | 0
    let word = Math.imul(mixed ^ (mixed >>> 16), 0x21f0aaad)
    word = Math.imul(word ^ (word >>> 15), 0x735a2d97)
    return (word ^ (word >>> 15)) | 0
  }
  let [a, b, c, counter] = [mix(), mix(), mix(), 1] as [number, number, number, number]
  const nextWord = (): number => {
    const word = (((a + b) | 0) + counter) | 0
    counter = (counter + 1) | 0
    a = b ^ (b >>> 9)
    b = (c + (c << 3)) | 0
    c = (((c << 21) | (c >>> 11)) + word) | 0
    return word >>> 0
  }
  for (let warmUp = 0; warmUp < 12; warmUp += 1) nextWord()
  return {
    below: (bound) => {
      if (bound <= 0n) throw new RangeError('There is no number below nothing.')
      const bits = (bound - 1n).toString(2).length
      // Numbers of so many bits that reach the bound are thrown away, which keeps the others even.
      for (;;) {
        let drawn = 0n
        for (let taken = 0; taken < bits; taken += 32) drawn = (drawn << 32n) | BigInt(nextWord())
        drawn &= (1n << BigInt(bits)) - 1n
        if (drawn < bound) return drawn
      }
    },
  }
}

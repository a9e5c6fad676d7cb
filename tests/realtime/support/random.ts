/** A small generator of numbers with a seed, so that what failed can be made to fail again (mulberry32). */
export class Random {
  #state: number

  constructor(seed: number) {
    this.#state = seed >>> 0
  }

  /** From 0 up to but not 1. */
  next(): number {
    this.#state = (this.#state + 0x6d2b79f5) >>> 0
    let mixed = this.#state
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32
  }

  /** A whole number from 0 up to but not `end`. */
  below(end: number): number {
    return Math.floor(this.next() * end)
  }

  chance(share: number): boolean {
    return this.next() < share
  }

  pick<Item>(items: readonly Item[]): Item {
    return items[this.below(items.length)] as Item
  }

  bytes(length: number): Uint8Array {
    return Uint8Array.from({ length }, () => this.below(256))
  }
}

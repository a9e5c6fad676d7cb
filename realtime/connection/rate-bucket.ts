/** How many seconds' worth may come at once. */
const BURST_SECONDS = 3

/** Lets `rateASecond` through on average. The caller brings the time. */
export class RateBucket {
  readonly #rateASecond: number
  #left: number
  #atMs: number

  constructor(rateASecond: number, nowMs: number) {
    this.#rateASecond = rateASecond
    this.#left = rateASecond * BURST_SECONDS
    this.#atMs = nowMs
  }

  /** Whether one more may pass now. */
  take(nowMs: number): boolean {
    const refill = (Math.max(0, nowMs - this.#atMs) / 1000) * this.#rateASecond
    this.#left = Math.min(this.#rateASecond * BURST_SECONDS, this.#left + refill)
    this.#atMs = nowMs
    if (this.#left < 1) return false
    this.#left -= 1
    return true
  }
}

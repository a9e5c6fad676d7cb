import type { WaysAnswer } from './ways-messages'

/** Past this a ladder or a wall is better served by a round number. */
const LONGEST_DIGITS = 9

const plain = new Intl.NumberFormat('en')
const short = new Intl.NumberFormat('en', { notation: 'compact', maximumSignificantDigits: 3 })

/** A count for reading: `1,284`, and past hundreds of millions `3.17T`. */
export function formatCount(count: string): string {
  const value = BigInt(count)
  return count.length <= LONGEST_DIGITS ? plain.format(value) : short.format(value)
}

/** Whether a line can be finished, in one figure: `118`, or `600,000+` when the counting was cut short. */
export const formatWays = ({ count, isExact }: WaysAnswer): string =>
  isExact ? formatCount(count) : `${formatCount(count)}+`

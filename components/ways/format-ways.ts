import type { WaysAnswer } from './ways-messages'

/** Past this a ladder or a wall is better served by a round number. */
const LONGEST_DIGITS = 9

const plain = new Intl.NumberFormat('en')
const short = new Intl.NumberFormat('en', { notation: 'compact', maximumSignificantDigits: 3 })

/** Past this the short names of numbers run out, and a power of ten is told. */
const LONGEST_NAMED_DIGITS = 15

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹'

/** A count for reading: `1,284`, past hundreds of millions `3.17T`, and `7.53 × 10¹⁸` where that has no name. */
export function formatCount(count: string): string {
  const value = BigInt(count)
  if (count.length <= LONGEST_DIGITS) return plain.format(value)
  if (count.length <= LONGEST_NAMED_DIGITS) return short.format(value)
  const [mantissa, power] = Number(count).toExponential(2).split('e+')
  return `${mantissa} × 10${[...(power ?? '')].map((digit) => RAISED[Number(digit)]).join('')}`
}

/** Whether a line can be finished, in one figure: `118`, or `600,000+` when the counting was cut short. */
export const formatWays = ({ count, isExact }: WaysAnswer): string =>
  isExact ? formatCount(count) : `${formatCount(count)}+`

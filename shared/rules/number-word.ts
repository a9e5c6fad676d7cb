const UP_TO_NINETEEN = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
  'thirteen',
  'fourteen',
  'fifteen',
  'sixteen',
  'seventeen',
  'eighteen',
  'nineteen',
] as const
const TENS = ['', '', 'twenty', 'thirty', 'forty', 'fifty', 'sixty', 'seventy', 'eighty', 'ninety'] as const

/** A count as a sentence has it: `no`, `three`, `twenty-one`; figures from a hundred, or where it is no whole count. */
export function numberWord(count: number): string {
  if (!Number.isInteger(count) || count < 0 || count >= 100) return String(count)
  const small = UP_TO_NINETEEN[count]
  if (small !== undefined) return small
  const tens = TENS[Math.floor(count / 10)] as string
  return count % 10 === 0 ? tens : `${tens}-${UP_TO_NINETEEN[count % 10]}`
}

import { percentileOf } from '@/tests/bench/row'
import { formatTable } from '@/tests/bench/table'

test.each([
  [[3, 1, 2], 0.5, 2],
  [[4, 1, 3, 2], 0.5, 2],
  [[7], 0.95, 7],
  [Array.from({ length: 100 }, (_, i) => i + 1), 0.95, 95],
])('of %p, the share %d does not exceed %d', (samples, share, expected) => {
  expect(percentileOf(samples, share)).toBe(expected)
})

test('no samples have no percentile', () => {
  expect(() => percentileOf([], 0.5)).toThrow(RangeError)
})

test('a row is set with its figures flush right and three figures of them', () => {
  const samples = [41.234, 39.5, 1234.5]
  expect(formatTable([{ line: 'E1', work: 'check it', samples, unit: 'µs', goal: 'under 50 µs' }])).toBe(
    [
      'line  work       median      p95  runs  goal',
      '----  --------  -------  -------  ----  -----------',
      'E1    check it  41.2 µs  1235 µs     3  under 50 µs',
    ].join('\n'),
  )
})

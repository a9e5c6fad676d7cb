import { formatCount, formatDate, formatList } from '@/components/words/format'
import { errors } from '@/components/words/en/errors'
import { API_ERRORS } from '@/shared/api/errors'

describe('words', () => {
  test('dates, counts and lists are written as the locale writes them', () => {
    expect(formatDate('2026-03-02T12:00:00Z')).toBe('2 March 2026')
    expect(formatCount(1, 'bar', 'bars')).toBe('1 bar')
    expect(formatCount(1200, 'bar', 'bars')).toBe('1,200 bars')
    expect(formatList(['do', 're', 'mi'])).toBe('do, re and mi')
  })

  test.each(Object.keys(API_ERRORS) as (keyof typeof API_ERRORS)[])(
    'the refusal %s has a sentence and a way on, without an exclamation mark',
    (code) => {
      const { title, more } = errors.of(code)
      expect(title).toMatch(/[^!]\.$/)
      expect(more).toMatch(/[^!]\.$/)
    },
  )

  test('an unknown field code is still answered in words', () => {
    expect(errors.field('never-heard-of')).toMatch(/\.$/)
    expect(errors.field('too-long', { max: 60 })).toBe('At most 60 characters.')
  })
})

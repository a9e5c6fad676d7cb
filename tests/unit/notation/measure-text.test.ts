import { ellipsise, measureTextPx } from '@/shared/notation/measure-text'

const FACE = 'AlegreyaItalic'
const LONG = 'second gesture: apex A, then home'

describe('the width of words', () => {
  test('grows with the text and with its size', () => {
    expect(measureTextPx('', FACE, 20)).toBe(0)
    expect(measureTextPx('ii', FACE, 20)).toBeCloseTo(2 * measureTextPx('i', FACE, 20), 9)
    expect(measureTextPx('m', FACE, 40)).toBeCloseTo(2 * measureTextPx('m', FACE, 20), 9)
    expect(measureTextPx('m', FACE, 20)).toBeGreaterThan(measureTextPx('i', FACE, 20))
  })

  test('leaves room for a letter the font does not have', () => {
    expect(measureTextPx('度', FACE, 20)).toBeGreaterThan(20)
  })
})

describe('words too long for their place', () => {
  test('stay whole where they fit', () => {
    expect(ellipsise(LONG, FACE, 16, measureTextPx(LONG, FACE, 16))).toBe(LONG)
  })

  test('end in an ellipsis, and fit at every width', () => {
    for (let width = 0; width < measureTextPx(LONG, FACE, 16); width += 3) {
      const text = ellipsise(LONG, FACE, 16, width)
      expect(measureTextPx(text, FACE, 16)).toBeLessThanOrEqual(width)
      if (text !== '') expect(LONG.startsWith(text.slice(0, -1)) && text.endsWith('…')).toBe(true)
    }
  })

  test('do not end in a space before the ellipsis, and are left out rather than cut to a letter', () => {
    const width = measureTextPx('second …', FACE, 16)
    expect(ellipsise(LONG, FACE, 16, width)).toBe('second…')
    expect(ellipsise(LONG, FACE, 16, measureTextPx('s…', FACE, 16))).toBe('')
  })

  test('are cut between letters, never inside one', () => {
    const text = ellipsise('𝄞𝄞𝄞𝄞𝄞𝄞', FACE, 16, measureTextPx('𝄞𝄞𝄞…', FACE, 16) + 0.01)
    expect(text).toBe('𝄞𝄞𝄞…')
  })
})

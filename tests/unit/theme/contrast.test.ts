import { readFileSync } from 'node:fs'
import { contrastOf } from '@/components/theme/contrast'
import { DARK, LIGHT, PAIRS } from '@/components/theme/pigments'

describe('contrast', () => {
  test.each([
    ['#000000', '#FFFFFF', 21],
    ['#FFFFFF', '#FFFFFF', 1],
    // Worked example widely published for WCAG: #767676 on white is the lightest grey that passes AA.
    ['#767676', '#FFFFFF', 4.54],
  ])('of %s on %s is %d', (a, b, expected) => {
    expect(contrastOf(a, b)).toBeCloseTo(expected, 2)
    expect(contrastOf(b, a)).toBeCloseTo(expected, 2)
  })
})

describe.each([
  ['light', LIGHT],
  ['dark', DARK],
])('the %s ground', (_, pigments) => {
  test.each(PAIRS)('sets $ink on $ground with a contrast of $atLeast or more', ({ ink, ground, atLeast }) => {
    expect(contrastOf(pigments[ink], pigments[ground])).toBeGreaterThanOrEqual(atLeast)
  })
})

describe('the page around the app', () => {
  const css = readFileSync('public/ground.css', 'utf8')
  const html = readFileSync('public/index.html', 'utf8')

  test.each([
    ['light', LIGHT, 1],
    ['dark', DARK, 2],
  ])('uses the pigments of the %s ground', (_, pigments, times) => {
    for (const name of ['vellum', 'lampblack', 'azurite'] as const) {
      const found = css.match(new RegExp(`--${name}: ${pigments[name].toLowerCase()};`, 'g'))
      expect(found).toHaveLength(times)
    }
    expect(html).toContain(`content="${pigments.vellum}"`)
  })
})

import { barAt, playheadPlace, staffPitchAt } from '@/shared/notation/hit-test'
import { layoutScore } from '@/shared/notation/layout-score'
import type { BarLayout, ScoreLayout, SystemLayout } from '@/shared/notation/score-layout'
import { stripOffsetPx } from '@/shared/notation/strip-offset'
import { barOf, LESSON_SCORE } from './sample-scores'

const page = layoutScore(LESSON_SCORE, { size: 'page', widthPx: 390 })

const placed = (layout: ScoreLayout): readonly { system: SystemLayout; bar: BarLayout }[] =>
  layout.systems.flatMap((system) => system.bars.map((bar) => ({ system, bar })))

const bar = (layout: ScoreLayout, number: number) => {
  const found = placed(layout).find((one) => one.bar.number === number)
  if (!found) throw new Error(`no bar ${number}`)
  return found
}

/** The middle of a bar, at a place above the bottom line of one of its staves. */
function pointAt(layout: ScoreLayout, number: number, staff: 0 | 1, place: number): [number, number] {
  const { system, bar: one } = bar(layout, number)
  const top = system.staves[staff]?.topPx ?? 0
  return [
    system.xPx + one.xPx + one.widthPx / 2,
    system.yPx + top + 4 * layout.spacePx - (place * layout.spacePx) / 2,
  ]
}

describe('what lies under a point', () => {
  test('every bar of every system is found at its middle, its edges and its head', () => {
    for (const { system, bar: one } of placed(page))
      for (const x of [one.xPx, one.xPx + one.widthPx / 2, one.xPx + one.widthPx - 1])
        for (const y of [0, system.heightPx / 2, system.heightPx - 1])
          expect(barAt(page, system.xPx + x, system.yPx + y)?.bar.number).toBe(one.number)
  })

  test('nothing is found over the clefs, between systems, or beside the music', () => {
    const [first] = page.systems
    expect(barAt(page, 5, 60)).toBeNull()
    expect(barAt(page, 200, (first?.heightPx ?? 0) + 1)).toBeNull()
    expect(barAt(page, 1000, 60)).toBeNull()
    expect(barAt(page, 200, -1)).toBeNull()
  })

  test.each([
    [0, 'E4'],
    [1, 'F4'],
    [8, 'F5'],
    [10, 'A5'],
    [-2, 'C4'],
  ])('place %i of the treble staff is %s', (place, pitch) => {
    const [x, y] = pointAt(page, 7, 0, place)
    expect(staffPitchAt(page, x, y)).toMatchObject({ bar: 7, pitch })
  })

  test('a point near a place snaps to it, and tells where the lozenge stands', () => {
    const [x, y] = pointAt(page, 7, 0, 3)
    const hit = staffPitchAt(page, x + 3, y + 0.2 * page.spacePx)
    expect(hit).toMatchObject({ pitch: 'A4', yPx: y })
    const { system, bar: one } = bar(page, 7)
    expect(hit?.xPx).toBe(system.xPx + one.xPx + one.axisPx)
  })

  test('the signature colours the pitch', () => {
    const flat = layoutScore({ ...LESSON_SCORE, signature: -1 }, { size: 'page', widthPx: 390 })
    const [x, y] = pointAt(flat, 7, 0, 4)
    expect(staffPitchAt(flat, x, y)?.pitch).toBe('Bb4')
  })

  test('the staff of the cantus, a folded bar, and the air above take no press', () => {
    expect(staffPitchAt(page, ...pointAt(page, 7, 1, 4))).toBeNull()
    expect(staffPitchAt(page, ...pointAt(page, 2, 0, 4))).toBeNull()
    expect(staffPitchAt(page, ...pointAt(page, 7, 0, 17))).toBeNull()
  })

  test('with the line below, its staff is the lower', () => {
    const below = layoutScore(
      { ...LESSON_SCORE, position: 'below', clefs: { cantus: 'treble', line: 'bass' } },
      { size: 'page', widthPx: 1000 },
    )
    expect(staffPitchAt(below, ...pointAt(below, 7, 1, 0))?.pitch).toBe('G2')
    expect(staffPitchAt(below, ...pointAt(below, 7, 0, 0))).toBeNull()
  })

  test('a cantus alone is written on its own staff', () => {
    const alone = layoutScore(
      { ...LESSON_SCORE, clefs: { cantus: 'tenor', line: null }, bars: [barOf(1), barOf(2)] },
      { size: 'page', widthPx: 400 },
    )
    expect(staffPitchAt(alone, ...pointAt(alone, 2, 0, 6))).toMatchObject({ bar: 2, pitch: 'C4' })
  })
})

describe('the line that follows the sound', () => {
  test('stands on the notes of a bar when they begin, and never moves back within a system', () => {
    let before = -Infinity
    for (const { system, bar: one } of placed(page).filter(
      (p) => p.system === page.systems[0] && !p.bar.isFolded,
    )) {
      expect(playheadPlace(page, { bar: one.number, fraction: 0 })?.xPx).toBe(
        system.xPx + one.xPx + one.axisPx,
      )
      for (const fraction of [0, 0.5, 1]) {
        const x = playheadPlace(page, { bar: one.number, fraction })?.xPx ?? NaN
        expect(x).toBeGreaterThanOrEqual(before)
        before = x
      }
    }
  })

  test('passes over bars that are set aside', () => {
    const end = playheadPlace(page, { bar: 1, fraction: 1 })
    expect(end?.xPx).toBe(playheadPlace(page, { bar: 4, fraction: 0 })?.xPx)
  })

  test('stands nowhere in a bar that is not there', () => {
    expect(playheadPlace(page, { bar: 99, fraction: 0 })).toBeNull()
  })
})

describe('a strip', () => {
  const windowPx = 390
  const strip = layoutScore(LESSON_SCORE, { size: 'strip', widthPx: windowPx, handBar: 6 })
  const system = strip.systems[0] as SystemLayout

  test('is one system, wider than its window', () => {
    expect(strip.systems).toHaveLength(1)
    expect(strip.widthPx).toBeGreaterThan(windowPx)
  })

  test('has the bar in hand in the middle of what shows beside the clefs', () => {
    const { bar: hand } = bar(strip, 6)
    const offset = stripOffsetPx(system, 6, windowPx)
    const middle = system.prefixPx + (windowPx - system.prefixPx) / 2
    expect(Math.abs(hand.xPx + hand.widthPx / 2 - offset - middle)).toBeLessThan(1)
  })

  test('never shows more than its own beginning and end', () => {
    expect(stripOffsetPx(system, 1, windowPx)).toBe(0)
    expect(stripOffsetPx(system, 11, windowPx)).toBe(system.widthPx - windowPx)
    expect(stripOffsetPx(system, null, windowPx)).toBe(0)
  })
})

import { BRAVURA } from '@/shared/notation/bravura'
import { layoutScore } from '@/shared/notation/layout-score'
import type { Mark, MarkRole } from '@/shared/notation/mark'
import { lozengeRadiusStaffSpaces } from '@/shared/notation/note-marks'
import type { ScoreBar, ScoreInput } from '@/shared/notation/score-input'
import type { BarLayout, ScoreLayout } from '@/shared/notation/score-layout'
import { barOf, LESSON_SCORE, proposal, whole } from './sample-scores'

const WALL = { size: 'wall', widthPx: 1400 } as const

const barLayout = (layout: ScoreLayout, number: number): BarLayout => {
  const bar = layout.systems.flatMap(({ bars }) => bars).find((one) => one.number === number)
  if (!bar) throw new Error(`no bar ${number}`)
  return bar
}
const marksOf = (layout: ScoreLayout, number: number, role: MarkRole): readonly Mark[] =>
  barLayout(layout, number).marks.filter((mark) => mark.role === role)
const glyphsOf = (layout: ScoreLayout, number: number, role: MarkRole): readonly string[] =>
  marksOf(layout, number, role).map((mark) => (mark.kind === 'glyph' ? mark.glyph : mark.kind))
const textsOf = (marks: readonly Mark[]): readonly string[] =>
  marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []))
const withBars = (bars: readonly ScoreBar[], over: Partial<ScoreInput> = {}): ScoreInput => ({
  ...LESSON_SCORE,
  bars,
  arcs: [],
  brackets: [],
  ...over,
})

describe('notes', () => {
  test('stand on their places: D4 hangs under the treble staff, F5 sits on its top line', () => {
    const layout = layoutScore(withBars([barOf(1, { cantus: 'D4', line: whole('F5') })]), WALL)
    const system = layout.systems[0]
    const [upper, lower] = system?.staves ?? []
    const heads = marksOf(layout, 1, 'notehead').map((mark) => (mark.kind === 'glyph' ? mark.y : NaN))
    expect(heads).toEqual([upper?.topPx, (lower?.topPx ?? 0) + 4.5 * layout.spacePx])
  })

  test('of the cantus and the line stand on one axis', () => {
    const layout = layoutScore(LESSON_SCORE, WALL)
    const bar = barLayout(layout, 9)
    for (const { box } of bar.marks.filter(({ role }) => role === 'notehead'))
      expect((box.left + box.right) / 2).toBeCloseTo(bar.axisPx, 6)
  })

  test('have ledger lines above and below the staff, longer than the head on both sides', () => {
    const layout = layoutScore(withBars([barOf(1, { cantus: 'C4', line: whole('C6') })]), WALL)
    const ledgers = marksOf(layout, 1, 'ledger')
    const [head] = marksOf(layout, 1, 'notehead')
    expect(ledgers).toHaveLength(3)
    for (const { box } of ledgers) {
      expect(box.left).toBeLessThan(head?.box.left ?? 0)
      expect(box.right).toBeGreaterThan(head?.box.right ?? 0)
    }
  })

  test.each<[string, number, readonly string[]]>([
    ['C#5', 0, ['accidentalSharp']],
    ['C#5', 2, []],
    ['C5', 2, ['accidentalNatural']],
    ['B4', -1, ['accidentalNatural']],
    ['Bb4', -1, []],
    ['Bb4', 0, ['accidentalFlat']],
    ['F##5', 1, ['accidentalDoubleSharp']],
    ['Ebb5', -3, ['accidentalDoubleFlat']],
  ])('%s under a signature of %i has the accidentals %j', (pitch, signature, accidentals) => {
    const layout = layoutScore(
      withBars([barOf(1, { cantus: null, line: whole(pitch) })], { signature }),
      WALL,
    )
    expect(glyphsOf(layout, 1, 'accidental')).toEqual(accidentals)
  })
})

describe('proposals', () => {
  test('grow with their number: more is larger, doubling adds the same, and a crowd stays on the staff', () => {
    const sizes = [1, 2, 4, 8].map(lozengeRadiusStaffSpaces)
    const steps = sizes.slice(1).map((size, i) => size - (sizes[i] as number))
    for (const step of steps) expect(step).toBeCloseTo(steps[0] as number, 9)
    expect(steps[0]).toBeGreaterThan(0)
    expect(lozengeRadiusStaffSpaces(500)).toBeLessThan(1.2)
  })

  test('carry their number, except one’s own', () => {
    const layout = layoutScore(
      withBars([barOf(1, { proposals: [proposal('A4', 11), proposal('E5', null)] })]),
      WALL,
    )
    expect(textsOf(marksOf(layout, 1, 'count'))).toEqual(['11'])
    expect(marksOf(layout, 1, 'lozenge')).toHaveLength(2)
  })

  test('are hollow, and filled where they break a law', () => {
    const layout = layoutScore(
      withBars([barOf(1, { proposals: [proposal('C5', 1), proposal('F5', 1, 'breach')] })]),
      WALL,
    )
    const looks = marksOf(layout, 1, 'lozenge').map((mark) => [
      mark.ink,
      mark.kind === 'polygon' && mark.isFilled,
    ])
    expect(looks).toContainEqual(['breach', true])
    expect(looks).toContainEqual(['line', false])
  })

  test('a step apart stand side by side, a fifth apart one under the other', () => {
    const centres = (...pitches: string[]): readonly number[] => {
      const layout = layoutScore(
        withBars([barOf(1, { proposals: pitches.map((p) => proposal(p, 4)) })]),
        WALL,
      )
      return marksOf(layout, 1, 'lozenge').map(({ box }) => (box.left + box.right) / 2)
    }
    const [fifthTop, fifthLow] = centres('D5', 'G4')
    expect(fifthTop).toBeCloseTo(fifthLow ?? 0, 6)
    const [stepTop, stepLow] = centres('D5', 'C5')
    expect((stepLow ?? 0) - (stepTop ?? 0)).toBeGreaterThan(10)
  })
})

describe('bars', () => {
  test('fill the wall, wider in play than frozen, folded where set aside', () => {
    const layout = layoutScore(LESSON_SCORE, WALL)
    const [system] = layout.systems
    expect(layout.systems).toHaveLength(1)
    expect(system?.widthPx).toBe(1400)
    const [frozen, released, folded] = [5, 7, 2].map((number) => barLayout(layout, number).widthPx)
    expect(released).toBeGreaterThan(1.4 * (frozen ?? 0))
    expect(folded).toBeLessThan(0.6 * (frozen ?? 0))
  })

  test('give an accidental room of its own, so that notes keep their distance', () => {
    const bars = ['D5', 'C#5', 'D5', 'E5'].map((pitch, i) => barOf(i + 1, { line: whole(pitch) }))
    const layout = layoutScore(withBars([...bars, barOf(5), barOf(6), barOf(7), barOf(8)]), WALL)
    const [plain, sharp, next, last] = [1, 2, 3, 8].map((number) => barLayout(layout, number))
    expect((sharp?.widthPx ?? 0) - (plain?.widthPx ?? 0)).toBeGreaterThan(layout.spacePx)
    expect(Math.abs((next?.widthPx ?? 0) - (plain?.widthPx ?? 0))).toBeLessThanOrEqual(1)
    // After its note a bar has as much room as any other, up to the closing line.
    const after = (bar: BarLayout | undefined): number => (bar?.widthPx ?? 0) - (bar?.axisPx ?? 0)
    expect(Math.abs(after(sharp) - after(plain))).toBeLessThanOrEqual(1)
    expect(after(last) - after(plain)).toBeCloseTo(1.06 * layout.spacePx, -1)
  })

  test('join under one bracket while released, and have two lines each when frozen', () => {
    const layout = layoutScore(LESSON_SCORE, WALL)
    const heads = (number: number) => marksOf(layout, number, 'head-line').length
    // A line and its hook at either end, a line alone between; two thin lines; nothing over a fold.
    expect([6, 7, 8, 5, 2].map(heads)).toEqual([2, 1, 2, 2, 0])
  })

  test('end in a thin and a thick line, and only the last', () => {
    const layout = layoutScore(LESSON_SCORE, { size: 'page', widthPx: 390 })
    const ends = layout.systems.map(({ spans }) => spans.filter(({ role }) => role === 'barline').length)
    expect(layout.systems.length).toBeGreaterThan(1)
    expect(ends).toEqual([...ends.slice(1).map(() => 1), 2])
  })

  test('stay in order and whole when a narrow screen breaks them into systems', () => {
    const layout = layoutScore(LESSON_SCORE, { size: 'page', widthPx: 320 })
    expect(layout.systems.flatMap(({ bars }) => bars.map(({ number }) => number))).toEqual(
      LESSON_SCORE.bars.map(({ number }) => number),
    )
    for (const system of layout.systems) {
      let x = system.prefixPx
      for (const bar of system.bars) {
        expect(bar.xPx).toBe(x)
        x += bar.widthPx
      }
      expect(x).toBe(system.widthPx)
    }
  })

  test('of a mini have no heads, clefs or rail', () => {
    const layout = layoutScore(LESSON_SCORE, { size: 'mini', widthPx: 420 })
    expect(layout.systems[0]?.prefix).toEqual([])
    expect(layout.systems[0]?.staves).toHaveLength(1)
    const roles = new Set(
      layout.systems.flatMap(({ bars }) => bars.flatMap(({ marks }) => marks.map((m) => m.role))),
    )
    for (const role of ['number', 'head-line', 'figure', 'motion', 'label'] as const)
      expect(roles).not.toContain(role)
  })
})

describe('the page', () => {
  test('puts the line’s staff above or below', () => {
    const voices = (position: ScoreInput['position']) =>
      layoutScore({ ...LESSON_SCORE, position }, WALL).systems[0]?.staves.map(({ voice }) => voice)
    expect(voices('above')).toEqual(['line', 'cantus'])
    expect(voices('below')).toEqual(['cantus', 'line'])
  })

  test('does not move the staves when a usual proposal, number or finding comes', () => {
    const quiet = withBars(
      LESSON_SCORE.bars.map((bar) => ({ ...bar, proposals: [], figure: null, motion: null })),
    )
    const busy = { ...LESSON_SCORE, brackets: [] }
    const tops = (input: ScoreInput) => layoutScore(input, WALL).systems[0]?.staves.map(({ topPx }) => topPx)
    expect(tops(busy)).toEqual(tops(quiet))
  })

  test('shrinks the staff to keep to a height, and says so by its own', () => {
    const free = layoutScore(LESSON_SCORE, WALL)
    const bound = layoutScore(LESSON_SCORE, { ...WALL, maxHeightPx: 400 })
    expect(free.heightPx).toBeGreaterThan(400)
    expect(bound.heightPx).toBeLessThanOrEqual(400)
    expect(bound.spacePx).toBeLessThan(free.spacePx)
  })

  test('shortens the words of a bracket to what it spans, once, where there is most room', () => {
    const label = 'second gesture, with far more to say of it than there is room for under two bars'
    const layout = layoutScore({ ...LESSON_SCORE, brackets: [{ fromBar: 4, toBar: 5, label }] }, WALL)
    const texts = layout.systems.flatMap(({ spans }) => textsOf(spans))
    expect(texts).toHaveLength(1)
    expect(texts[0]).toMatch(/^second .*…$/)
  })

  test('stays the same for the same score', () => {
    expect(layoutScore(LESSON_SCORE, WALL)).toEqual(layoutScore(LESSON_SCORE, WALL))
  })

  test('draws an empty score as staves alone', () => {
    const layout = layoutScore(withBars([]), WALL)
    expect(layout.systems).toHaveLength(1)
    expect(layout.heightPx).toBeGreaterThan(0)
  })

  test('sets the treble clef on the G line', () => {
    const layout = layoutScore(LESSON_SCORE, WALL)
    const [system] = layout.systems
    const clef = system?.prefix.find(({ role }) => role === 'clef')
    expect(clef?.kind === 'glyph' && clef.y).toBe((system?.staves[0]?.topPx ?? 0) + 3 * layout.spacePx)
    expect(clef && clef.box.right - clef.box.left).toBeCloseTo(BRAVURA.gClef.right * layout.spacePx, 6)
  })
})

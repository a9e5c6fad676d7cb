import { layoutScore } from '@/shared/notation/layout-score'
import type { Mark, MarkRole } from '@/shared/notation/mark'
import { writtenNotes } from '@/shared/notation/reading'
import type { ScoreBar } from '@/shared/notation/score-input'
import { stemsOf, type StemNote } from '@/shared/notation/stems'
import type { BarNotes } from '@/shared/theory/note'
import { ticksOf, valueOf } from '@/shared/theory/note-value'
import { barOf, LESSON_SCORE } from './sample-scores'

const n = (pitch: string | null, ticks: number, tied?: true) =>
  tied ? { pitch, ticks, tied } : { pitch, ticks }
const WALL = { size: 'wall', widthPx: 1400 } as const
const layoutOf = (...lines: readonly BarNotes[]) => {
  const bars: readonly ScoreBar[] = lines.map((line, i) => barOf(i + 1, { line }))
  return layoutScore({ ...LESSON_SCORE, bars, arcs: [], brackets: [] }, WALL)
}
const marksOf = (layout: ReturnType<typeof layoutOf>, role: MarkRole): readonly Mark[] =>
  layout.systems.flatMap(({ bars }) =>
    bars.flatMap(({ marks }) => marks.filter((mark) => mark.role === role)),
  )
const stemNote = (place: number | null, tick: number, ticks: number): StemNote => ({
  place,
  tick,
  written: valueOf(ticks),
})

describe('values', () => {
  test.each([1920, 1440, 960, 720, 480, 240])('of %i ticks are written as one note', (ticks) => {
    expect(ticksOf(valueOf(ticks))).toBe(ticks)
  })

  test('that no note has are written as the longest that fits', () => {
    expect(valueOf(1000)).toEqual({ value: 'half', isDotted: false })
    expect(valueOf(1)).toEqual({ value: 'eighth', isDotted: false })
  })
})

describe('stems', () => {
  test('go up below the middle line, down from it, an octave long, and to the middle line out of ledger lines', () => {
    const { stems } = stemsOf(
      [stemNote(3, 0, 480), stemNote(4, 480, 480), stemNote(-4, 960, 480), stemNote(12, 1440, 480)],
      false,
    )
    expect(stems).toEqual([
      { isUp: true, hasFlag: false, tipDepth: -1 },
      { isUp: false, hasFlag: false, tipDepth: 5.5 },
      { isUp: true, hasFlag: false, tipDepth: 2 },
      { isUp: false, hasFlag: false, tipDepth: 2 },
    ])
  })

  test('of eighth notes within a half are beamed; a single one has a flag; whole notes and rests have none', () => {
    const pair = stemsOf(
      [stemNote(2, 0, 480), stemNote(3, 480, 240), stemNote(8, 720, 240), stemNote(4, 960, 960)],
      false,
    )
    expect(pair.beams).toEqual([{ from: 1, to: 2, isUp: false }])
    expect(pair.stems.map((stem) => stem?.isUp)).toEqual([true, false, false, false])
    const single = stemsOf([stemNote(2, 0, 720), stemNote(3, 720, 240), stemNote(null, 960, 960)], false)
    expect(single.beams).toEqual([])
    expect(single.stems.map((stem) => stem?.hasFlag)).toEqual([false, true, undefined])
    expect(stemsOf([stemNote(2, 0, 1920)], false).stems).toEqual([null])
  })
})

describe('accidentals within the bar', () => {
  test('hold for their own place to the bar line, and are taken back by a natural', () => {
    const standing = writtenNotes([n('C#5', 480), n('C#5', 480), n('C#4', 480), n('C5', 480)], 0, false)
    expect(standing.map((note) => note.standing)).toEqual([0, 1, 0, 1])
  })

  test('are not said again on a note that is held over the bar line, nor lent to those after it', () => {
    const standing = writtenNotes([n('C#5', 960), n('C#5', 960)], 0, true)
    expect(standing.map((note) => note.standing)).toEqual([1, 0])
  })
})

describe('ties', () => {
  test('go over the bar line from head to head, on the side away from the stems', () => {
    const layout = layoutOf([n(null, 960), n('D5', 960, true)], [n('D5', 960), n('C5', 960)])
    const [tie, ...more] = marksOf(layout, 'tie')
    expect(more).toEqual([])
    expect(tie?.kind === 'crescent' && tie.outer[1] < tie.from[1]).toBe(true)
    const first = layout.systems[0]?.bars[0]
    expect(tie?.box.right).toBeGreaterThan(first?.widthPx ?? Infinity)
  })

  test('into a bar that is not written end in the open, before the bar line', () => {
    const layout = layoutOf([n('A4', 960), n('D5', 960, true)], [n('E5', 960), n('C5', 960)])
    const [tie] = marksOf(layout, 'tie')
    expect(tie?.box.right).toBeLessThan(layout.systems[0]?.bars[0]?.widthPx ?? 0)
  })
})

describe('a measured score', () => {
  test('says cut time once, on every staff of its first system; one of whole notes says none', () => {
    const bars = Array.from({ length: 12 }, (_, i) =>
      barOf(i + 1, { line: [n('A4', 480), n('B4', 480), n('C5', 960)] }),
    )
    const layout = layoutScore(
      { ...LESSON_SCORE, bars, arcs: [], brackets: [] },
      { size: 'page', widthPx: 390 },
    )
    const metres = layout.systems.map(({ prefix }) => prefix.filter(({ role }) => role === 'metre').length)
    expect(metres.length).toBeGreaterThan(1)
    expect(metres).toEqual([2, ...metres.slice(1).map(() => 0)])
    const plain = layoutScore(LESSON_SCORE, WALL)
    expect(plain.systems.flatMap(({ prefix }) => prefix.filter(({ role }) => role === 'metre'))).toEqual([])
  })

  test('gives long notes more room than short ones, but not twice as much', () => {
    const [bar] = layoutOf([n('A4', 960), n('B4', 480), n('A4', 480)], [n('A4', 1920)]).systems[0]?.bars ?? []
    const [a, b, c] = bar?.moments.map(({ xPx }) => xPx) ?? []
    const [half, quarter] = [(b as number) - (a as number), (c as number) - (b as number)]
    expect(half / quarter).toBeGreaterThan(1.2)
    expect(half / quarter).toBeLessThan(2)
  })
})

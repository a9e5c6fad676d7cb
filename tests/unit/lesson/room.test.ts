import { createJudge, type Judge } from '@/components/lesson/judge'
import { countFindings, markRoom, rankRoom } from '@/components/lesson/room'
import { groupProposals, type ChorusState } from '@/shared/board'
import type { Checker, Finding } from '@/shared/rules'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarState } from '@/shared/wire/documents'
import type { Line } from '@/shared/theory/note'

const notes = (bars: Readonly<Record<number, string>>): Line =>
  Object.fromEntries(Object.entries(bars).map(([bar, pitch]) => [bar, [{ pitch, ticks: WHOLE_TICKS }]]))

const finding = (
  bars: readonly number[],
  level: Finding['level'] = 'law',
  code = 'similar-into-fifth',
): Finding => ({
  ruleId: 'dir-perfect',
  code,
  level,
  voice: 'line',
  bars,
  notes: [],
  args: {},
})

/** Speaks against E5 in bar 7 when it comes after C5, and remarks on any D5 in bar 6. */
const judge: Judge = {
  ofLine: () => [],
  ofAll: () => undefined,
  ofNotes: (line) => [
    ...(line[6]?.[0]?.pitch === 'C5' && line[7]?.[0]?.pitch === 'E5' ? [finding([6, 7])] : []),
    ...(line[6]?.[0]?.pitch === 'D5' ? [finding([6], 'preference', 'wide')] : []),
  ],
}

const OPEN: BarState = { state: 'released', setAside: false, round: 1 }

/** The groups of a room whose members wrote these notes, in this order. */
type Written = Readonly<Record<number, string>>

const room = (many: readonly Written[], bars: readonly number[] = [6, 7]) => {
  const chorus: Record<
    number,
    Record<string, { notes: { pitch: string; ticks: number }[]; round: number }>
  > = {}
  many.forEach((written, index) => {
    for (const [bar, pitch] of Object.entries(written))
      (chorus[Number(bar)] ??= {})[`member-${index}`] = { notes: [{ pitch, ticks: WHOLE_TICKS }], round: 1 }
  })
  const states = Object.fromEntries(bars.map((bar) => [bar, OPEN]))
  return groupProposals(chorus as ChorusState, bars, states)
}

describe('the room, grouped over a span', () => {
  const members: readonly Written[] = [
    { 6: 'C5', 7: 'C5' },
    { 6: 'C5', 7: 'E5' },
    { 6: 'C5', 7: 'C5' },
    { 6: 'D5', 7: 'C5' },
    { 6: 'C5', 7: 'E5' },
    { 6: 'A4', 7: 'C5' },
    { 6: 'A4' },
    { 6: 'A4' },
    { 6: 'A4' },
  ]

  test('finished gestures first; then more proposers, then fewer breaches and remarks', () => {
    expect(
      rankRoom(room(members), judge).map(({ notes: { 6: at6, 7: at7 }, count }) => [
        at6?.[0]?.pitch,
        at7?.[0]?.pitch,
        count,
      ]),
    ).toEqual([
      ['C5', 'C5', 2],
      ['C5', 'E5', 2],
      ['A4', 'C5', 1],
      ['D5', 'C5', 1],
      ['A4', undefined, 3],
    ])
  })

  test('each group carries its findings and who made it', () => {
    const risen = rankRoom(room(members), judge)[1]
    expect(risen?.findings.map(({ bars }) => bars)).toEqual([[6, 7]])
    expect(risen?.memberIds).toEqual(['member-1', 'member-4'])
  })

  test('the order in which they came does not change the ranking', () => {
    const keys = (many: typeof members) => rankRoom(room(many), judge).map(({ key }) => key)
    expect(keys([...members].reverse())).toEqual(keys(members))
  })
})

describe('the room, read as lozenges and counts', () => {
  const many: readonly Written[] = [
    ...Array.from({ length: 9 }, () => ({ 6: 'C5', 7: 'E5' })),
    { 6: 'C5', 7: 'C5' },
    { 6: 'A4', 7: 'E5' },
    { 6: 'D5' },
  ]
  const groups = rankRoom(room(many), judge)

  test('a finding says of how many members it is true', () => {
    expect(
      countFindings(groups).map(({ findings, count }) => [findings.map(({ bars }) => bars).flat(), count]),
    ).toEqual([
      [[6, 7], 9],
      [[6], 1],
    ])
  })

  test('lozenges are counted by bar and note, the most proposed first', () => {
    expect(markRoom(groups).map(({ bar, notes: [note], count }) => [bar, note?.pitch, count])).toEqual([
      [6, 'C5', 10],
      [6, 'A4', 1],
      [6, 'D5', 1],
      [7, 'E5', 10],
      [7, 'C5', 1],
    ])
  })

  test('the breach belongs to the bar it is completed in, and to the note that most brought it to', () => {
    expect(markRoom(groups).map(({ bar, notes: [note], tone }) => [bar, note?.pitch, tone])).toEqual([
      [6, 'C5', 'line'],
      [6, 'A4', 'line'],
      [6, 'D5', 'line'],
      [7, 'E5', 'breach'],
      [7, 'C5', 'line'],
    ])
  })

  test('a note that most reach well keeps its ink', () => {
    const mostly = rankRoom(
      room([
        { 6: 'C5', 7: 'E5' },
        { 6: 'A4', 7: 'E5' },
        { 6: 'A4', 7: 'E5' },
      ]),
      judge,
    )
    expect(markRoom(mostly).find(({ bar }) => bar === 7)?.tone).toBe('line')
  })

  test('an empty room has nothing to show', () => {
    expect(markRoom([])).toEqual([])
    expect(countFindings([])).toEqual([])
  })
})

describe('the judge asks each question once', () => {
  test('five hundred alike cost one, and one that is new costs one more', () => {
    const asked: number[] = []
    const checker: Checker = {
      checkCantus: () => [],
      checkLine: () => [],
      annotate: (_line, proposals) => {
        asked.push(proposals.length)
        return proposals.map(() => [finding([6])])
      },
    }
    const real = createJudge(checker, {}, new Set())
    const many = Array.from({ length: 500 }, (_, index) => ({ 6: index % 3 === 0 ? 'C5' : 'D5' }))
    expect(countFindings(rankRoom(room(many, [6]), real))[0]?.count).toBe(500)
    expect(asked).toEqual([2])
    rankRoom(room([...many, { 6: 'E5' }], [6]), real)
    expect(asked).toEqual([2, 1])
    expect(real.ofNotes(notes({ 6: 'E5' }))).toHaveLength(1)
    expect(asked).toEqual([2, 1])
  })
})

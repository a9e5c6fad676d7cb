import * as Y from 'yjs'
import {
  adoptBars,
  clearRoom,
  createBoardState,
  draftsOf,
  drawGesture,
  eraseGesture,
  eraseSheetBar,
  freezeBars,
  groupProposals,
  INITIAL_STAGE,
  readBoard,
  readChorus,
  readSheet,
  releaseBars,
  setBarsAside,
  takeBackBars,
  takeBarsUp,
  updateChorus,
  updateStage,
  writeBoardState,
  writeMark,
  writeSheetBar,
  type ChorusState,
} from '@/shared/board'
import { EXERCISE } from '@/tests/realtime/support/lesson'

const whole = (pitch: string) => [{ pitch, ticks: 1920 }]

function createBoard(): Y.Doc {
  const doc = new Y.Doc()
  writeBoardState(doc, createBoardState(EXERCISE, INITIAL_STAGE))
  return doc
}

describe('the board', () => {
  it('reads what was written, and nothing before it has arrived', () => {
    expect(readBoard(new Y.Doc())).toBeNull()
    expect(readBoard(createBoard())).toEqual(createBoardState(EXERCISE, INITIAL_STAGE))
  })

  it('follows the acts of the lectern', () => {
    const doc = createBoard()
    releaseBars(doc, [1, 2, 99])
    setBarsAside(doc, [3])
    clearRoom(doc, [2])
    updateStage(doc, { prompt: 'The cadence', showsSpread: true })
    const board = readBoard(doc)
    expect(board?.bars[1]).toEqual({ state: 'released', setAside: false, round: 1 })
    expect(board?.bars[2]).toEqual({ state: 'released', setAside: false, round: 2 })
    expect(board?.bars[3]).toEqual({ state: 'frozen', setAside: true, round: 1 })
    expect(board?.bars[99]).toBeUndefined()
    expect(board?.stage).toEqual({ ...INITIAL_STAGE, prompt: 'The cadence', showsSpread: true })
    freezeBars(doc, [1])
    takeBarsUp(doc, [3])
    expect(readBoard(doc)?.bars[1]?.state).toBe('frozen')
    expect(readBoard(doc)?.bars[3]?.setAside).toBe(false)
  })

  it('adopts and freezes, and takes back without releasing', () => {
    const doc = createBoard()
    releaseBars(doc, [1, 2])
    adoptBars(doc, { 1: whole('A4'), 2: whole('C5'), 40: whole('C5') })
    expect(readBoard(doc)?.line).toEqual({ 1: whole('A4'), 2: whole('C5') })
    expect(readBoard(doc)?.bars[1]?.state).toBe('frozen')
    takeBackBars(doc, [1])
    expect(readBoard(doc)?.line).toEqual({ 2: whole('C5') })
    expect(readBoard(doc)?.bars[1]?.state).toBe('frozen')
  })

  it('draws gestures of three bars or more that are in the score', () => {
    const doc = createBoard()
    expect(drawGesture(doc, 'a', { from: 1, to: 2, label: '' })).toEqual({ ok: false, reason: 'too-short' })
    expect(drawGesture(doc, 'a', { from: 10, to: 12, label: '' })).toEqual({
      ok: false,
      reason: 'no-such-bar',
    })
    expect(drawGesture(doc, 'a', { from: 1, to: 3, label: 'opening' }).ok).toBe(true)
    expect(readBoard(doc)?.gestures).toEqual({ a: { from: 1, to: 3, label: 'opening' } })
    // Written past the writer, by a page that knows no better: nobody reads it.
    doc.getMap('gestures').set('b', { from: 4, to: 5, label: '' })
    eraseGesture(doc, 'a')
    expect(readBoard(doc)?.gestures).toEqual({})
  })

  it('advances its clock at every act, so that each can be acknowledged', () => {
    const doc = createBoard()
    const acts: (() => void)[] = [
      () => releaseBars(doc, [1]),
      () => adoptBars(doc, { 1: whole('A4') }),
      () => takeBackBars(doc, [1]),
      () => void drawGesture(doc, 'a', { from: 1, to: 3, label: '' }),
      () => eraseGesture(doc, 'a'),
    ]
    for (const act of acts) {
      const before = Y.getState(doc.store, doc.clientID)
      act()
      expect(Y.getState(doc.store, doc.clientID)).toBeGreaterThan(before)
    }
  })

  it.each([
    ['bars', '1', { state: 'molten', setAside: false, round: 1 }],
    ['bars', '0', { state: 'released', setAside: false, round: 1 }],
    ['bars', '1', 7],
    ['line', '1', { notes: [] }],
    ['stage', 'value', { prompt: 5 }],
    ['gestures', 'a', 'x'],
    ['spread', '1', [{ notes: whole('A4'), count: 0 }]],
  ])('passes over %s %s = %j', (map, key, value) => {
    const doc = createBoard()
    const before = readBoard(doc)
    doc.getMap(map).set(key, value)
    const after = readBoard(doc)
    expect(after).toEqual(map === 'stage' ? { ...before, stage: INITIAL_STAGE } : before)
  })
})

describe('a sheet', () => {
  it('holds notes and marks, and says what is a draft', () => {
    const board = createBoard()
    const doc = new Y.Doc()
    releaseBars(board, [1, 2, 3])
    for (const bar of [1, 2, 3]) writeSheetBar(doc, bar, whole('A4'), 1)
    writeMark(doc, { kind: 'apex', bar: 7 })
    doc.getMap('marks').set('apex:8', { kind: 'weak', bar: 8 })
    freezeBars(board, [2])
    clearRoom(board, [3])
    const [sheet, state] = [readSheet(doc), readBoard(board)]
    expect(sheet.marks).toEqual([{ kind: 'apex', bar: 7 }])
    expect(state && draftsOf(sheet, state)).toEqual([
      { bar: 2, notes: whole('A4'), because: 'frozen' },
      { bar: 3, notes: whole('A4'), because: 'older-round' },
    ])
    eraseSheetBar(doc, 1)
    expect(Object.keys(readSheet(doc).notes)).toEqual(['2', '3'])
  })
})

describe('the room grouped', () => {
  const bar = { state: 'released', setAside: false, round: 1 } as const
  const states = { 1: bar, 2: bar, 3: { ...bar, round: 2 } }
  const written = (pitch: string, round = 1) => ({ notes: whole(pitch), round })

  it('joins equal notes over a span, whoever wrote them, in an order that does not depend on them', () => {
    const chorus: ChorusState = {
      1: { m1: written('A4'), m2: written('A4'), m3: written('A4'), m4: written('D5') },
      2: { m2: written('B4'), m1: written('B4') },
    }
    const groups = groupProposals(chorus, [1, 2], states)
    expect(groups.map(({ count, memberIds, isComplete }) => [count, memberIds, isComplete])).toEqual([
      [2, ['m1', 'm2'], true],
      [1, ['m3'], false],
      [1, ['m4'], false],
    ])
    const reversed: ChorusState = Object.fromEntries(
      Object.entries(chorus).map(([number, members]) => [
        number,
        Object.fromEntries(Object.entries(members).reverse()),
      ]),
    )
    expect(groupProposals(reversed, [1, 2], states)).toEqual(groups)
  })

  it('tells spellings apart, and does not count what an older round left', () => {
    const chorus: ChorusState = { 1: { m1: written('C#5'), m2: written('Db5') }, 3: { m1: written('A4') } }
    expect(groupProposals(chorus, [1], states)).toHaveLength(2)
    expect(groupProposals(chorus, [3], states)).toEqual([])
  })

  it('reads a chorus the same by single keys as whole', () => {
    const doc = new Y.Doc()
    const map = doc.getMap('proposals')
    map.set('1:member-1', written('A4'))
    map.set('1:member-2', written('B4'))
    map.set('2:member-1', written('C5'))
    const before = readChorus(doc)
    map.delete('2:member-1')
    map.set('1:member-2', written('D5'))
    map.set('x:member-2', written('D5'))
    const after = updateChorus(before, doc, ['2:member-1', '1:member-2', 'x:member-2'])
    expect(after).toEqual(readChorus(doc))
    expect(after[1]?.['member-1']).toBe(before[1]?.['member-1'])
  })
})

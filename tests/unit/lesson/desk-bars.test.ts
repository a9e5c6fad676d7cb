import { nearestOpenBar, nextReadBar, readDeskBar, type DeskBar } from '@/components/lesson/desk-bars'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarState, SheetBar } from '@/shared/wire/documents'

const c5: SheetBar['notes'] = [{ pitch: 'C5', ticks: WHOLE_TICKS }]
const e5: SheetBar['notes'] = [{ pitch: 'E5', ticks: WHOLE_TICKS }]
const state = (over: Partial<BarState> = {}): BarState => ({
  state: 'released',
  setAside: false,
  round: 1,
  ...over,
})

describe('what a bar is to the student', () => {
  test('released: what was written in this round stands', () => {
    expect(readDeskBar(7, state(), null, { notes: c5, round: 1 })).toEqual({
      kind: 'open',
      number: 7,
      notes: c5,
      earlier: null,
    })
  })

  test('cleared for another round: what stood there is offered again, not proposed', () => {
    expect(readDeskBar(7, state({ round: 2 }), null, { notes: c5, round: 1 })).toEqual({
      kind: 'open',
      number: 7,
      notes: null,
      earlier: c5,
    })
  })

  test('frozen: the class’s notes are read, the student’s own are a draft where they differ', () => {
    const frozen = state({ state: 'frozen' })
    expect(readDeskBar(7, frozen, e5, { notes: c5, round: 1 })).toMatchObject({
      kind: 'closed',
      adopted: e5,
      draft: c5,
    })
    expect(readDeskBar(7, frozen, c5, { notes: c5, round: 1 })).toMatchObject({ adopted: c5, draft: null })
    expect(readDeskBar(7, frozen, null, null)).toMatchObject({ adopted: null, draft: null })
  })

  test('set aside is set aside, released or not', () => {
    expect(readDeskBar(2, state({ setAside: true }), null, { notes: c5, round: 1 }).kind).toBe('set-aside')
    expect(readDeskBar(2, state({ setAside: true, state: 'frozen' }), e5, null)).toMatchObject({
      adopted: e5,
    })
  })
})

describe('walking the bars', () => {
  const bar = (number: number, kind: DeskBar['kind']): DeskBar =>
    kind === 'open'
      ? { kind, number, notes: null, earlier: null }
      : kind === 'closed'
        ? { kind, number, adopted: null, draft: null }
        : { kind, number, adopted: null }
  const bars = [bar(1, 'closed'), bar(2, 'set-aside'), bar(3, 'open'), bar(4, 'closed'), bar(5, 'open')]

  test('the nearest open bar is taken in hand, the earlier of two', () => {
    expect(nearestOpenBar(bars, 1)).toBe(3)
    expect(nearestOpenBar(bars, 4)).toBe(3)
    expect(nearestOpenBar(bars, 5)).toBe(5)
    expect(nearestOpenBar([bar(1, 'closed')], 1)).toBeNull()
  })

  test('bars set aside are stepped over', () => {
    expect(nextReadBar(bars, 1, 1)).toBe(3)
    expect(nextReadBar(bars, 3, -1)).toBe(1)
    expect(nextReadBar(bars, 5, 1)).toBeNull()
    expect(nextReadBar(bars, 1, -1)).toBeNull()
  })
})

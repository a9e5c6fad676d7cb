import { barsBetween, moveSelection, runsOf, selectedBars, type Selection } from '@/components/lesson/bars'

describe('bars', () => {
  test('a span is the same from either end', () => {
    expect(barsBetween(6, 8)).toEqual([6, 7, 8])
    expect(barsBetween(8, 6)).toEqual([6, 7, 8])
    expect(barsBetween(4, 4)).toEqual([4])
  })

  test('bars fall into runs of neighbours', () => {
    expect(runsOf([1, 2, 3, 6, 8, 9])).toEqual([[1, 2, 3], [6], [8, 9]])
    expect(runsOf([])).toEqual([])
  })
})

describe('selecting bars on the lectern', () => {
  const press = (selection: Selection, bar: number, isExtending = false) =>
    moveSelection(selection, { kind: 'press', bar, isExtending }, 11)
  const step = (selection: Selection, by: number, isExtending = false) =>
    moveSelection(selection, { kind: 'step', by, isExtending }, 11)

  test('a press selects one bar, shift and a press the span to it, a second press nothing', () => {
    const one = press(null, 6)
    expect(selectedBars(one)).toEqual([6])
    expect(selectedBars(press(one, 8, true))).toEqual([6, 7, 8])
    expect(selectedBars(press(one, 4, true))).toEqual([4, 5, 6])
    expect(press(one, 6)).toBeNull()
  })

  test('the span turns about its anchor when it is extended to the other side', () => {
    const span = press(press(null, 6), 8, true)
    expect(selectedBars(press(span, 5, true))).toEqual([5, 6])
  })

  test('arrows walk and stop at the ends', () => {
    expect(selectedBars(step(null, 1))).toEqual([1])
    expect(selectedBars(step(null, -1))).toEqual([11])
    expect(selectedBars(step(press(null, 11), 1))).toEqual([11])
    expect(selectedBars(step(press(null, 5), 1, true))).toEqual([5, 6])
    expect(
      selectedBars(moveSelection(press(null, 5), { kind: 'end', of: 'last', isExtending: true }, 7)),
    ).toEqual([5, 6, 7])
  })

  test('all and none', () => {
    expect(selectedBars(moveSelection(null, { kind: 'all' }, 3))).toEqual([1, 2, 3])
    expect(moveSelection(press(null, 5), { kind: 'none' }, 11)).toBeNull()
  })
})

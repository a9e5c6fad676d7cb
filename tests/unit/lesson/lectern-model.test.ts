import { actsFor, readLectern, sortPeople } from '@/components/lectern/lectern-model'
import type { Judge } from '@/components/lesson/judge'
import { viewOf } from '@/components/lesson/lesson-view'
import { promptSizePx } from '@/components/wall/wall-model'
import { measureWall } from '@/components/wall/wall-measure'
import { createBoardState, INITIAL_STAGE, type ChorusState } from '@/shared/board'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarState, BoardExercise } from '@/shared/wire/documents'
import type { PresentMember } from '@/shared/wire/rooms'

const EXERCISE: BoardExercise = {
  title: 'A second voice over the cantus in D',
  cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' '),
  mode: 'dorian',
  final: 'D',
  species: 1,
  position: 'above',
  clefs: { cantus: 'treble', line: 'treble' },
  signature: 0,
  ruleSet: { id: 'none', name: 'None', rules: {} },
}
const judge: Judge = { ofLine: () => [], ofAll: () => undefined, ofNotes: () => [] }
const whole = (pitch: string, round = 1) => ({ notes: [{ pitch, ticks: WHOLE_TICKS }], round })
const bar = (over: Partial<BarState>): BarState => ({ state: 'frozen', setAside: false, round: 1, ...over })

const view = (bars: Readonly<Record<number, BarState>>, line: Readonly<Record<number, string>> = {}) => {
  const start = createBoardState(EXERCISE, INITIAL_STAGE)
  return viewOf({
    ...start,
    bars: { ...start.bars, ...bars },
    line: Object.fromEntries(Object.entries(line).map(([at, pitch]) => [at, whole(pitch).notes])),
  })
}
const open678 = {
  6: bar({ state: 'released' }),
  7: bar({ state: 'released' }),
  8: bar({ state: 'released' }),
}
const chorus: ChorusState = {
  6: { noor: whole('C5'), tomasz: whole('C5'), annika: whole('A4') },
  7: { noor: whole('C5'), tomasz: whole('C5') },
  8: { noor: whole('B4'), tomasz: whole('B4') },
}

describe('what the lectern lists', () => {
  test('without a selection, the released bars as one span', () => {
    const lectern = readLectern(view(open678), chorus, judge, [])
    expect(lectern).toMatchObject({ bars: [6, 7, 8], finished: 2, unfinished: 1, distinct: 1 })
    expect(lectern.groups.map(({ count, isComplete }) => [count, isComplete])).toEqual([
      [2, true],
      [1, false],
    ])
  })

  test('with one, the bars selected', () => {
    const lectern = readLectern(view(open678), chorus, judge, [6])
    expect(lectern).toMatchObject({ bars: [6], finished: 3, unfinished: 0, distinct: 2 })
  })

  test('the score keeps every lozenge of the room, whatever is selected', () => {
    const { score } = readLectern(view(open678), chorus, judge, [6])
    expect(score.bars[7]?.proposals).toMatchObject([{ count: 2 }])
  })

  test('nothing released, nothing selected: nothing listed', () => {
    expect(readLectern(view({}), chorus, judge, [])).toMatchObject({ bars: [], groups: [], distinct: 0 })
  })
})

describe('what may be done with bars', () => {
  test('frozen bars are released, released ones frozen, a mixed span may do both', () => {
    expect(actsFor(view({}), {}, [6])).toMatchObject({ canRelease: true, canFreeze: false, canClear: false })
    expect(actsFor(view(open678), chorus, [6])).toMatchObject({
      canRelease: false,
      canFreeze: true,
      canClear: true,
    })
    expect(actsFor(view(open678), chorus, [5, 6])).toMatchObject({ canRelease: true, canFreeze: true })
  })

  test('only what was adopted is taken back, only what is set aside is taken up', () => {
    const mixed = view({ 2: bar({ setAside: true }) }, { 9: 'D5' })
    expect(actsFor(mixed, {}, [9])).toMatchObject({ canTakeBack: true, canTakeUp: false, canSetAside: true })
    expect(actsFor(mixed, {}, [2])).toMatchObject({ canTakeBack: false, canTakeUp: true, canSetAside: false })
  })

  test('three bars stay in the reading', () => {
    expect(actsFor(view({}), {}, [1, 2, 3, 4, 5, 6, 7, 8]).canSetAside).toBe(true)
    expect(actsFor(view({}), {}, [1, 2, 3, 4, 5, 6, 7, 8, 9]).canSetAside).toBe(false)
  })

  test('proposals of a round that is over are not cleared again', () => {
    const second = view({ 6: bar({ state: 'released', round: 2 }) })
    expect(actsFor(second, chorus, [6]).canClear).toBe(false)
  })
})

test('raised hands come first, then who is here, then names as people sort them', () => {
  const person = (name: string, over: Partial<PresentMember> = {}): PresentMember => ({
    memberId: name,
    name,
    role: 'student',
    isOnline: true,
    hand: false,
    ...over,
  })
  const people = [
    person('Zsófia'),
    person('Émile'),
    person('Eva', { isOnline: false }),
    person('Tomasz', { hand: true }),
    person('Ana'),
  ]
  expect(sortPeople(people).map(({ name }) => name)).toEqual(['Tomasz', 'Ana', 'Émile', 'Zsófia', 'Eva'])
})

describe('the wall fits its screen', () => {
  test('as drawn at 1920 by 1080', () => {
    expect(measureWall(1920, 1080)).toMatchObject({
      scale: 1,
      scoreWidthPx: 1380,
      headerPx: 96,
      footerPx: 190,
    })
  })

  test.each([
    [1024, 768],
    [1366, 768],
    [2560, 1440],
    [3840, 2160],
  ])('at %i by %i the parts make up the width', (width, height) => {
    const { scoreWidthPx, asidePx, gapPx, marginPx, scoreHeightPx, isStacked } = measureWall(width, height)
    expect(isStacked).toBe(false)
    expect(scoreWidthPx + asidePx + gapPx + 2 * marginPx).toBe(width)
    expect(scoreHeightPx).toBeGreaterThan(height / 2)
  })

  test('on a phone they stand under each other', () => {
    expect(measureWall(390, 844)).toMatchObject({ isStacked: true, scoreWidthPx: 358 })
  })

  test('a longer prompt is set smaller', () => {
    const sizes = [40, 120, 280].map((length) => promptSizePx('x'.repeat(length)))
    expect(sizes).toEqual([...sizes].sort((a, b) => b - a))
    expect(new Set(sizes).size).toBe(3)
  })
})

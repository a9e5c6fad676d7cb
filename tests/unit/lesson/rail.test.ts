import { barReadBefore, railOf } from '@/components/lesson/rail'
import type { Exercise } from '@/shared/rules'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line } from '@/shared/theory/note'
import { pitchOf } from '@/shared/theory/pitch'

const exercise: Exercise = {
  cantus: ['D4', 'F4', 'E4', 'D4', 'G4', 'F4', 'A4', 'G4', 'F4', 'E4', 'D4'].map(pitchOf),
  mode: 'dorian',
  final: { letter: 'D', alteration: 0 },
  species: 1,
  position: 'above',
}
const line = (notes: Readonly<Record<number, string>>): Line =>
  Object.fromEntries(Object.entries(notes).map(([bar, pitch]) => [bar, [{ pitch, ticks: WHOLE_TICKS }]]))

describe('the rail between the staves', () => {
  test('each written bar has its figure, an unwritten one has none', () => {
    const rail = railOf(
      exercise,
      line({ 1: 'A4', 4: 'A4', 5: 'B4', 9: 'D5', 10: 'C#5', 11: 'D5' }),
      new Set(),
    )
    expect(rail.map(({ figure }) => figure)).toEqual([
      '5',
      null,
      null,
      '5',
      '3',
      null,
      null,
      null,
      '6',
      '6',
      '8',
    ])
  })

  test('the cadence is entered in parallel and left in contrary motion', () => {
    const rail = railOf(exercise, line({ 9: 'D5', 10: 'C#5', 11: 'D5' }), new Set())
    expect(rail.slice(8).map(({ motion }) => motion)).toEqual([null, 'parallel', 'contrary'])
  })

  test('bars set aside are read across', () => {
    const written = line({ 1: 'A4', 2: 'D5', 3: 'C5', 4: 'B4' })
    expect(railOf(exercise, written, new Set([2, 3]))[3]).toMatchObject({ figure: '6', motion: 'oblique' })
    expect(railOf(exercise, written, new Set([2, 3]))[1]).toEqual({
      interval: null,
      figure: null,
      motion: null,
      later: [],
    })
    expect(railOf(exercise, written, new Set())[3]).toMatchObject({ motion: 'parallel' })
    expect(barReadBefore(4, new Set([2, 3]))).toBe(1)
    expect(barReadBefore(1, new Set())).toBeNull()
  })

  test('a tenth keeps its own figure', () => {
    expect(railOf(exercise, line({ 6: 'A5' }), new Set())[5]?.figure).toBe('10')
  })

  test('later notes have figures of their own, eighth notes and rests none', () => {
    const note = (pitch: string | null, ticks: number) => ({ pitch, ticks })
    const bar = [note('A4', 480), note('B4', 240), note('C5', 240), note(null, 480), note('D5', 480)]
    expect(railOf(exercise, { 1: bar }, new Set())[0]).toMatchObject({
      figure: '5',
      later: [{ tick: 1440, text: '8' }],
    })
  })
})

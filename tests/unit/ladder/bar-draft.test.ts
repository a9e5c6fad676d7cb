import {
  draftOf,
  eraseInDraft,
  isComplete,
  isReachable,
  notesOfDraft,
  rhythmChoices,
  startDraft,
  withRhythm,
  writeInDraft,
  type RhythmChoice,
} from '@/components/ladder/bar-draft'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { barNotesSchema } from '@/shared/wire/documents'

const lengthsOf = ({ values }: RhythmChoice) => values.map(({ ticks, isRest }) => (isRest ? -ticks : ticks))
const choiceOf = (
  species: 2 | 3 | 4 | 5,
  lengths: readonly number[],
  tieOut = false,
  bar = 4,
): RhythmChoice => {
  const found = rhythmChoices(species, bar, 10).find(
    (each) => each.tieOut === tieOut && lengthsOf(each).join() === lengths.join(),
  )
  if (!found) throw new Error(`no rhythm ${lengths.join()}`)
  return found
}

describe('the rhythms offered for a bar', () => {
  test.each([2, 3, 4, 5] as const)('of species %i fill it exactly, and each is there once', (species) => {
    for (const bar of [1, 2, 9, 10]) {
      const choices = rhythmChoices(species, bar, 10)
      for (const { values } of choices)
        expect(values.reduce((sum, { ticks }) => sum + ticks, 0)).toBe(WHOLE_TICKS)
      const names = choices.map((each) => `${lengthsOf(each).join()} ${each.tieOut}`)
      expect(new Set(names).size).toBe(names.length)
    }
  })

  test('are one whole note in the last bar, and begin with a rest in the first bar of second and fourth species', () => {
    for (const species of [2, 3, 4, 5] as const)
      expect(rhythmChoices(species, 10, 10).map(lengthsOf)).toEqual([[1920]])
    for (const species of [2, 4] as const)
      expect(rhythmChoices(species, 1, 10)[0]?.values[0]?.isRest).toBe(true)
  })
})

describe('a bar that is being written', () => {
  const halfQuarters = choiceOf(5, [960, 480, 480])

  test('takes its notes in turn, is whole with the last, and keeps the hand there', () => {
    let draft = startDraft(halfQuarters, null)
    const places: number[] = []
    for (const pitch of ['A4', 'B4', 'C5']) {
      places.push(draft.place)
      expect(isComplete(draft)).toBe(false)
      draft = writeInDraft(draft, pitch)
    }
    expect([...places, draft.place]).toEqual([0, 1, 2, 2])
    expect(isComplete(draft)).toBe(true)
    expect(notesOfDraft(draft)).toEqual([
      { pitch: 'A4', ticks: 960 },
      { pitch: 'B4', ticks: 480 },
      { pitch: 'C5', ticks: 480 },
    ])
  })

  test('holds over its last note only, in a form the documents take', () => {
    const tied = choiceOf(4, [960, 960], true)
    const draft = writeInDraft(writeInDraft(startDraft(tied, null), 'A4'), 'D5')
    expect(notesOfDraft(draft)).toEqual([
      { pitch: 'A4', ticks: 960 },
      { pitch: 'D5', ticks: 960, tied: true },
    ])
    expect(barNotesSchema.safeParse(notesOfDraft(draft)).success).toBe(true)
  })

  test('begins with the note that is held into it, and after a rest with the first note', () => {
    expect(startDraft(choiceOf(4, [960, 960]), 'D5')).toMatchObject({ pitches: ['D5', null], place: 1 })
    expect(startDraft(choiceOf(2, [-960, 960], false, 1), 'D5')).toMatchObject({
      pitches: [null, null],
      place: 1,
    })
  })

  test('is nothing before its first note, and what stands before the first gap until it is whole', () => {
    const rest = startDraft(choiceOf(2, [-960, 960], false, 1), null)
    expect(notesOfDraft(rest)).toEqual([])
    const begun = writeInDraft(startDraft(halfQuarters, null), 'A4')
    expect(notesOfDraft(begun)).toEqual([{ pitch: 'A4', ticks: 960 }])
    expect([0, 1, 2].map((place) => isReachable(begun, place))).toEqual([true, true, false])
  })

  test('keeps its pitches, in order, under another rhythm', () => {
    const written = draftOf(
      [
        { pitch: 'A4', ticks: 960 },
        { pitch: 'B4', ticks: 960 },
      ],
      null,
    )
    const other = withRhythm(written, halfQuarters)
    expect(other).toMatchObject({ pitches: ['A4', 'B4', null], place: 2 })
    expect(withRhythm(writeInDraft(other, 'C5'), choiceOf(5, [960, 960])).pitches).toEqual(['A4', 'B4'])
  })

  test('loses a note by one press, from the hand backwards, and nothing when it is empty', () => {
    let draft = draftOf(
      [
        { pitch: 'A4', ticks: 960 },
        { pitch: 'B4', ticks: 960 },
      ],
      null,
    )
    draft = eraseInDraft(draft)
    expect(draft).toMatchObject({ pitches: ['A4', null], place: 1 })
    draft = eraseInDraft(draft)
    expect(draft).toMatchObject({ pitches: [null, null], place: 0 })
    expect(eraseInDraft(draft)).toBe(draft)
  })
})

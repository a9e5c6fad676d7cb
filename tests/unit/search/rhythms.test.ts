/** In species with shorter notes too, what the search finds is what the checker has nothing against. */
import { createChecker, PRESETS, type Exercise, type RuleSet } from '@/shared/rules'
import { createSearch } from '@/shared/search'
import { rhythmsOf, type BarRhythm } from '@/shared/search/rhythm'
import type { BarNotes, Line, Note } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'
import { createDice, exerciseOf, lawsOf, SEED, spell } from './cases'

/** Every line of a species over some pitches, ties joining equal pitches only. Written without the search's own net. */
function* everyLine({ species, cantus }: Exercise, pitches: readonly PitchName[]): Generator<Line> {
  const count = cantus.length
  const rhythms = cantus.map((_, index) =>
    rhythmsOf(species, {
      isFirst: index === 0,
      isPenultimate: index === count - 2,
      isLast: index === count - 1,
    }),
  )
  function* bars(
    index: number,
    held: PitchName | null,
    before: readonly BarNotes[],
  ): Generator<readonly BarNotes[]> {
    if (index === count) {
      if (held === null) yield before
      return
    }
    for (const rhythm of (rhythms[index] ?? []).filter(({ tieIn }) => tieIn === (held !== null))) {
      for (const notes of fill(rhythm, held, pitches)) {
        const last = notes.at(-1) as Note
        yield* bars(index + 1, last.tied ? last.pitch : null, [...before, notes])
      }
    }
  }
  for (const line of bars(0, null, [])) {
    yield Object.fromEntries(line.map((notes, index) => [index + 1, notes]))
  }
}

function* fill(
  { values, tieOut }: BarRhythm,
  held: PitchName | null,
  pitches: readonly PitchName[],
): Generator<BarNotes> {
  function* notes(index: number, before: BarNotes): Generator<BarNotes> {
    const value = values[index]
    if (value === undefined) {
      yield before
      return
    }
    const choices = value.isRest ? [null] : index === 0 && held !== null ? [held] : pitches
    for (const pitch of choices) {
      const isTied = tieOut && index === values.length - 1
      const note: Note = isTied ? { pitch, ticks: value.ticks, tied: true } : { pitch, ticks: value.ticks }
      yield* notes(index + 1, [...before, note])
    }
  }
  yield* notes(0, [])
}

const WORLDS = [
  { exercise: exerciseOf('D4 E4 D4', 'dorian', 'D', 'above', 2), pitches: 'A4 B4 C5 C#5 D5' },
  { exercise: exerciseOf('A4 B4 A4', 'aeolian', 'A', 'below', 2), pitches: 'D4 E4 F4 G#4 A4' },
  { exercise: exerciseOf('E4 D4', 'dorian', 'D', 'above', 3), pitches: 'A4 B4 C#5 D5' },
  { exercise: exerciseOf('D4 E4 D4', 'dorian', 'D', 'above', 4), pitches: 'A4 C#5 D5' },
  { exercise: exerciseOf('E4 F4 E4', 'phrygian', 'E', 'below', 4), pitches: 'D4 E4' },
  { exercise: exerciseOf('E4 D4', 'dorian', 'D', 'above', 5), pitches: 'C#5 D5' },
].flatMap((world) => PRESETS.map((ruleSet) => ({ ...world, ruleSet: ruleSet as RuleSet })))

test.each(WORLDS)(
  'species $exercise.species over $pitches is judged alike, $exercise.position, $ruleSet.id',
  ({ exercise, pitches, ruleSet }) => {
    const names = pitches.split(' ')
    const compass = { lowest: names[0] as string, highest: names.at(-1) as string }
    const search = createSearch(exercise, ruleSet, { compass })
    const ways = search.find()
    const found = new Set([...ways.solutions()].map(spell))
    expect(ways.count).toBe(BigInt(found.size))
    const checker = createChecker(exercise, lawsOf(ruleSet))
    const wronglyFound: string[] = []
    const missed: string[] = []
    for (const line of everyLine(exercise, names)) {
      const isLawful = checker.checkLine(line).every(({ level }) => level !== 'law')
      const isFound = found.has(spell(line))
      if (isFound === isLawful) continue
      if (isFound) wronglyFound.push(spell(line))
      else if (search.find({ line }).count !== 1n) missed.push(spell(line))
    }
    expect({ wronglyFound, missed }).toEqual({ wronglyFound: [], missed: [] })
  },
)

/** A line with one of its notes changed to another pitch, and what is tied to it. */
function change(line: Line, dice: (count: number) => number, pitches: readonly PitchName[]): Line {
  const bars = Object.keys(line).map(Number)
  const bar = bars[dice(bars.length)] as number
  const notes = line[bar] as BarNotes
  const at = dice(notes.length)
  const { pitch, ticks } = notes[at] as Note
  const changed = notes.map((note, index): Note =>
    index === at ? { pitch: pitches[dice(pitches.length)] as string, ticks } : note,
  )
  return pitch === null || changed.some(({ tied }) => tied) ? line : { ...line, [bar]: changed }
}

describe.each([2, 3, 4, 5] as const)('species %i over a short cantus', (species) => {
  test.each(
    PRESETS.flatMap((ruleSet) => (['above', 'below'] as const).map((position) => ({ ruleSet, position }))),
  )('$ruleSet.id, $position: drawn lines and their neighbours are judged alike', ({ ruleSet, position }) => {
    const exercise = exerciseOf('D4 F4 E4 D4', 'dorian', 'D', position, species)
    const compass = position === 'above' ? { lowest: 'F4', highest: 'F5' } : { lowest: 'A3', highest: 'F4' }
    const search = createSearch(exercise, ruleSet, { compass })
    const checker = createChecker(exercise, lawsOf(ruleSet))
    const dice = createDice(SEED + species)
    const pitches = 'G3 A3 B3 C4 C#4 D4 E4 F4 G4 A4 B4 C5 C#5 D5 E5'.split(' ')
    const drawn = search.find().draw(SEED, 40)
    const unlike: string[] = []
    for (const line of [
      ...drawn,
      ...drawn.flatMap((line) => [0, 1, 2].map(() => change(line, dice, pitches))),
    ]) {
      const isLawful = checker.checkLine(line).every(({ level }) => level !== 'law')
      if ((search.find({ line }).count === 1n) !== isLawful) unlike.push(spell(line))
    }
    expect(unlike).toEqual([])
  })
})

/** What the search finds is what the checker has nothing against, and nothing else. */
import { createChecker, createCore1, PRESETS, type Exercise, type RuleSet } from '@/shared/rules'
import { createSearch } from '@/shared/search'
import type { PitchName } from '@/shared/theory/pitch'
import { createDice, exerciseOf, FUX_EXERCISES, lawsOf, SEED, spell, wholeNotes } from './cases'

const COMPASS = { above: { lowest: 'C4', highest: 'F5' }, below: { lowest: 'A2', highest: 'G4' } } as const

const ruleSetsFor = ({ position }: Exercise): readonly RuleSet[] => [
  ...PRESETS,
  createCore1(COMPASS[position]),
]

/** Every line of so many bars over some pitches. */
function* everyLine(pitches: readonly PitchName[], bars: number): Generator<readonly PitchName[]> {
  if (bars === 0) yield []
  else for (const line of everyLine(pitches, bars - 1)) for (const pitch of pitches) yield [...line, pitch]
}

const isLawful = (checker: ReturnType<typeof createChecker>, names: readonly PitchName[]): boolean =>
  checker.checkLine(wholeNotes(names)).every(({ level }) => level !== 'law')

const WORLDS = [
  { exercise: exerciseOf('D4 F4 E4 D4', 'dorian', 'D'), pitches: 'C#4 D4 F4 A4 Bb4 C#5 D5' },
  { exercise: exerciseOf('A4 C5 B4 A4', 'aeolian', 'A', 'below'), pitches: 'D3 F3 G#3 A3 C4 E4 A4' },
  { exercise: exerciseOf('E4 F4 G4 F4 E4', 'phrygian', 'E'), pitches: 'D4 E4 A4 B4 C5 D5' },
].flatMap((world) => ruleSetsFor(world.exercise).map((ruleSet) => ({ ...world, ruleSet })))

test.each(WORLDS)(
  'every line over $pitches is judged alike, $exercise.position, $ruleSet.id',
  ({ exercise, pitches, ruleSet }) => {
    const search = createSearch(exercise, ruleSet, { compass: COMPASS[exercise.position] })
    const found = new Set([...search.find().solutions()].map(spell))
    const checker = createChecker(exercise, lawsOf(ruleSet))
    const wronglyFound: string[] = []
    const missed: string[] = []
    for (const names of everyLine(pitches.split(' '), exercise.cantus.length)) {
      const isFound = found.has(names.join(' '))
      if (isFound === isLawful(checker, names)) continue
      if (isFound) wronglyFound.push(names.join(' '))
      // A note outside the pool is tried only where it is written.
      else if (search.find({ line: wholeNotes(names) }).count !== 1n) missed.push(names.join(' '))
    }
    expect({ wronglyFound, missed }).toEqual({ wronglyFound: [], missed: [] })
  },
)

describe(`a hundred thousand lines from seed ${SEED}`, () => {
  const CASES = [FUX_EXERCISES[0], FUX_EXERCISES[1]]
    .map((exercise) => exercise as Exercise)
    .flatMap((exercise) => ruleSetsFor(exercise).map((ruleSet) => ({ ruleSet, exercise })))
  test.each(CASES)('$ruleSet.id $exercise.mode $exercise.position', ({ ruleSet, exercise }) => {
    const ways = createSearch(exercise, ruleSet, { compass: COMPASS[exercise.position] }).find()
    const dice = createDice(SEED)
    const pool = [...new Set(ways.alive().flatMap(({ notes }) => notes.map(({ pitch }) => pitch as string)))]
    const found = new Set([...ways.solutions()].map(spell))
    const drawn = ways.draw(SEED, 1_000).map((line) => spell(line).split(' '))
    const checker = createChecker(exercise, lawsOf(ruleSet))
    const unlike: string[] = []
    let lawful = 0
    for (let turn = 0; turn < Math.ceil(100_000 / CASES.length); turn += 1) {
      const names = [...(drawn[dice(drawn.length)] as string[])]
      for (let change = dice(4); change > 0; change -= 1) {
        names[dice(names.length)] = pool[dice(pool.length)] as string
      }
      const isGood = isLawful(checker, names)
      if (isGood) lawful += 1
      if (isGood !== found.has(names.join(' '))) unlike.push(names.join(' '))
    }
    expect(unlike).toEqual([])
    // Both kinds were met.
    expect(lawful).toBeGreaterThan(1_000)
    expect(lawful).toBeLessThan(Math.ceil(100_000 / CASES.length) - 1_000)
  })
})

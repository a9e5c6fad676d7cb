/** What is answered beside the number: draws, the best lines, dead ends, and all of it for lines partly written. */
import { createChecker, createCore1, findPreset, PRESETS, type Exercise, type RuleSet } from '@/shared/rules'
import { createSearch, type Ways } from '@/shared/search'
import type { Line } from '@/shared/theory/note'
import { createDice, exerciseOf, FUX_EXERCISES, SEED, spell, wholeNotes } from './cases'

const DORIAN = FUX_EXERCISES[0] as Exercise
const CORE_1 = createCore1({ lowest: 'D4', highest: 'D6' })
const preset = (id: string): RuleSet => findPreset(id) as RuleSet

const all = (ways: Ways): readonly string[] => [...ways.solutions()].map(spell)

const summary = (ways: Ways) => ({
  count: ways.count,
  alive: ways.alive(),
  deadEnd: ways.deadEnd,
  best: ways.best(3),
  draw: ways.draw(SEED, 5),
})

describe('drawing', () => {
  const ways = createSearch(DORIAN, CORE_1).find()

  test('is even over all 118 lines', () => {
    const times = 118 * 200
    const drawn = new Map<string, number>()
    for (const line of ways.draw(SEED, times)) drawn.set(spell(line), (drawn.get(spell(line)) ?? 0) + 1)
    const chiSquare = all(ways)
      .map((line) => (drawn.get(line) ?? 0) - 200)
      .reduce((sum, excess) => sum + (excess * excess) / 200, 0)
    // 117 degrees of freedom: between 70.6 and 176.6 in all but one in ten thousand draws, each way.
    expect(chiSquare).toBeGreaterThan(66)
    expect(chiSquare).toBeLessThan(180)
    expect(drawn.size).toBe(118)
  })

  test('gives the same lines for a seed, and others for another', () => {
    expect(ways.draw(7, 20)).toEqual(ways.draw(7, 20))
    expect(ways.draw(7, 20)).not.toEqual(ways.draw(8, 20))
  })
})

describe('the best lines', () => {
  const costOf = (exercise: Exercise, ruleSet: RuleSet, line: Line): number =>
    createChecker(exercise, ruleSet).checkLine(line).length

  test.each(PRESETS.flatMap((ruleSet) => [0, 1].map((index) => ({ ruleSet, index }))))(
    '$ruleSet.id, exercise $index: have least said against them',
    ({ ruleSet, index }) => {
      const exercise = [
        exerciseOf('D4 F4 E4 D4 E4 D4', 'dorian', 'D'),
        exerciseOf('A3 C4 B3 C4 B3 A3', 'aeolian', 'A', 'below'),
      ][index] as Exercise
      const ways = createSearch(exercise, ruleSet).find()
      const checker = createChecker(exercise, ruleSet)
      const costs = [...ways.solutions()].map((line) => checker.checkLine(line).length).sort((a, b) => a - b)
      const { lines, isExact } = ways.best(12)
      expect(isExact).toBe(true)
      expect(lines.map(({ cost }) => cost)).toEqual(costs.slice(0, 12))
      expect(lines.map(({ line }) => costOf(exercise, ruleSet, line))).toEqual(lines.map(({ cost }) => cost))
      expect(new Set(lines.map(({ line }) => spell(line))).size).toBe(lines.length)
    },
  )

  test('are all the lines there are when more are asked for, and follow the weights', () => {
    const ways = createSearch(DORIAN, preset('open-undergrad')).find()
    const { lines } = ways.best(10_000)
    expect(lines.length).toBe(Number(ways.count))
    expect(new Set(lines.map(({ line }) => spell(line)))).toEqual(new Set(all(ways)))
    const weighed = createSearch(DORIAN, preset('open-undergrad'), { weights: { 'imperfect-preferred': 5 } })
    for (const { line, cost } of weighed.find().best(300).lines) {
      const findings = createChecker(DORIAN, preset('open-undergrad')).checkLine(line)
      const heavy = findings.filter(({ ruleId }) => ruleId === 'imperfect-preferred').length
      expect(cost).toBe(findings.length + 4 * heavy)
    }
  })
})

describe('dead ends', () => {
  test('name the bar and the law of a line that breaks one', () => {
    // Parallel fifths from the first bar to the second.
    const search = createSearch(DORIAN, preset('open-undergrad'))
    const { count, deadEnd } = search.find({ line: wholeNotes(['A4', 'C5']) })
    expect(count).toBe(0n)
    expect(deadEnd).toEqual({ bar: 2, rules: ['par-perfect'], because: 'laws' })
  })

  test('name a law that looks at one note alone', () => {
    const search = createSearch(DORIAN, preset('open-undergrad'))
    const { deadEnd } = search.find({ line: { 4: [{ pitch: 'G4', ticks: 1920 }] } })
    expect(deadEnd).toMatchObject({ bar: 4, rules: ['vert-fourth'] })
  })

  test('stand where a lawful beginning has no way on', () => {
    const search = createSearch(DORIAN, CORE_1)
    const alive = search.find({ line: wholeNotes(['D5']) }).alive()
    const dead = ['D5', 'F5', 'A5', 'C5'].filter(
      (pitch) => !alive[1]?.notes.some((note) => note.pitch === pitch),
    )
    for (const pitch of dead) {
      const { count, deadEnd } = search.find({ line: wholeNotes(['D5', pitch]) })
      expect(count).toBe(0n)
      expect(deadEnd?.bar).toBeGreaterThanOrEqual(2)
      expect(deadEnd?.rules.length).toBeGreaterThan(0)
    }
    expect(dead.length).toBeGreaterThan(0)
  })

  test('at the end name the laws of the whole line', () => {
    const once: RuleSet = { id: 'once', name: 'Once', rules: { 'mel-single-climax': { level: 'law' } } }
    const exercise = exerciseOf('D4 E4 D4', 'dorian', 'D')
    const { deadEnd } = createSearch(exercise, once).find({ line: wholeNotes(['A4', 'G4', 'A4']) })
    expect(deadEnd).toEqual({ bar: 3, rules: ['mel-single-climax'], because: 'laws' })
  })

  test('tell of a bar that has no place in the rhythm of the species', () => {
    const half = [{ pitch: 'A4', ticks: 960 }]
    const { deadEnd } = createSearch(DORIAN, CORE_1).find({ line: { 3: half } })
    expect(deadEnd).toEqual({ bar: 3, rules: [], because: 'rhythm' })
  })
})

describe('questions one after the other', () => {
  test('are answered as if each were the first', () => {
    const dice = createDice(SEED)
    const ruleSet = preset('jeppesen-16c')
    const exercise = FUX_EXERCISES[4] as Exercise
    const search = createSearch(exercise, ruleSet)
    const lines = search.find().draw(SEED, 12)
    for (const whole of lines) {
      const bars = Object.keys(whole).map(Number)
      const line = Object.fromEntries(bars.filter(() => dice(3) > 0).map((bar) => [bar, whole[bar] ?? []]))
      const offered = {
        [1 + dice(bars.length)]: [{ pitch: ['G4', 'A4', 'F#4'][dice(3)] as string, ticks: 1920 }],
      }
      expect(summary(search.find({ line, offered }))).toEqual(
        summary(createSearch(exercise, ruleSet).find({ line, offered })),
      )
    }
  })

  test('agree with all lines, sifted', () => {
    const search = createSearch(DORIAN, CORE_1)
    const lines = all(search.find()).map((line) => line.split(' '))
    for (const bar of [1, 3, 6, 10]) {
      for (const pitch of new Set(lines.map((names) => names[bar - 1] as string))) {
        const sifted = lines.filter((names) => names[bar - 1] === pitch)
        const ways = search.find({ line: { [bar]: [{ pitch, ticks: 1920 }] } })
        expect(all(ways)).toEqual(sifted.map((names) => names.join(' ')))
      }
    }
  })

  test('go on a little at a time, and are not answered before they are ready', () => {
    const search = createSearch(DORIAN, CORE_1)
    const inquiry = search.ask()
    expect(() => inquiry.ways()).toThrow('not ready')
    let turns = 1
    while (!inquiry.advance(100)) turns += 1
    expect(turns).toBeGreaterThan(20)
    expect(summary(inquiry.ways())).toEqual(summary(createSearch(DORIAN, CORE_1).find()))
  })

  test('make an older answer void', () => {
    const search = createSearch(DORIAN, CORE_1)
    const first = search.find()
    search.ask()
    expect(() => first.draw(1, 1)).toThrow('since')
  })
})

test('bars set aside are not read, and the rest is finished without them', () => {
  const setAside = new Set([2, 5, 6])
  const reduced = exerciseOf('D4 E4 D4 A4 G4 F4 E4 D4', 'dorian', 'D')
  const bars = [1, 3, 4, 7, 8, 9, 10, 11]
  const ways = createSearch(DORIAN, CORE_1, { setAside }).find()
  const plain = createSearch(reduced, CORE_1).find()
  expect(ways.count).toBe(plain.count)
  expect(all(ways)).toEqual(all(plain))
  expect(ways.alive().map(({ bar }) => bar)).toEqual(bars)
  expect(ways.count).toBeGreaterThan(0n)
})

describe('limits', () => {
  const exercise = FUX_EXERCISES[6] as Exercise
  const ruleSet = preset('fux-mann')

  test('turn the number into at least so many', () => {
    const exact = createSearch(exercise, ruleSet).find()
    const capped = createSearch(exercise, ruleSet, { limits: { nodes: 500, beam: 40 } }).find()
    expect(exact.isExact).toBe(true)
    expect(capped.isExact).toBe(false)
    expect(capped.count).toBeGreaterThan(0n)
    expect(capped.count).toBeLessThan(exact.count)
    const checker = createChecker(exercise, ruleSet)
    for (const line of capped.draw(SEED, 50)) {
      expect(checker.checkLine(line).filter(({ level }) => level === 'law')).toEqual([])
    }
  })

  test('numbers past what a plain number holds are exact', () => {
    // Every bar has the same choices, and no rule forbids any: choices to the power of bars.
    const long = exerciseOf(Array(40).fill('D4').join(' '), 'dorian', 'D')
    const free: RuleSet = { id: 'free', name: 'Free', rules: {} }
    const compass = { lowest: 'D4', highest: 'C5' }
    const ways = createSearch(long, free, { compass }).find()
    const choices = ways.alive()[0]?.notes.length as number
    expect(choices).toBeGreaterThan(7)
    expect(ways.count).toBe(BigInt(choices) ** 40n)
    expect(ways.alive()[20]?.notes[0]?.count).toBe(BigInt(choices) ** 39n)
  })
})

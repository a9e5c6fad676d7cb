import fc from 'fast-check'
import { generateCanti, generateSolutions } from '@/shared/generate'
import {
  checkCantus,
  checkLine,
  createCore1,
  findPreset,
  PRESETS,
  readExercise,
  type RuleSet,
} from '@/shared/rules'
import { MODES } from '@/shared/theory/mode'
import { comparePitches, formatPitch, pitchClassOf, pitchOf, type Pitch } from '@/shared/theory/pitch'
import { scaleBetween } from '@/shared/theory/scale'
import { SEED } from '../rules/random-score'

const FINALS = {
  ionian: 'C',
  dorian: 'D',
  phrygian: 'E',
  lydian: 'F',
  mixolydian: 'G',
  aeolian: 'A',
} as const
const preset = (id: string) => findPreset(id) as RuleSet

const judge = (cantus: readonly Pitch[], mode: (typeof MODES)[number], final: string, ruleSet: RuleSet) =>
  checkCantus({ cantus, mode, final: pitchClassOf(final), species: 1, position: 'above' }, ruleSet)

describe.each(PRESETS.map((ruleSet) => [ruleSet.id, ruleSet] as const))('%s', (_id, ruleSet) => {
  test.each(MODES)('canti firmi in %s break no law of a cantus', (mode) => {
    const final = FINALS[mode]
    const made = generateCanti({
      mode,
      final: pitchClassOf(final),
      ruleSet,
      seed: SEED,
      times: 100,
      length: 10,
    })
    if (!made.ok) throw new Error(made.reason.message)
    for (const cantus of made.value.canti) {
      expect(cantus).toHaveLength(10)
      const laws = judge(cantus, mode, final, ruleSet).filter(({ level }) => level === 'law')
      expect(
        laws.map(({ ruleId, bars }) => `${cantus.map(formatPitch).join(' ')}: ${ruleId} ${bars}`),
      ).toEqual([])
    }
  })
})

test.each(['open-undergrad', 'starter', 'jeppesen-16c'])(
  'with taste, %s has nothing whatever to say against a cantus',
  (id) => {
    const ruleSet = preset(id)
    const request = { mode: 'dorian', final: pitchClassOf('D'), ruleSet, seed: SEED, length: 8 } as const
    const made = generateCanti({ ...request, times: 200, isTasteful: true })
    if (!made.ok) throw new Error(made.reason.message)
    for (const cantus of made.value.canti) expect(judge(cantus, 'dorian', 'D', ruleSet)).toEqual([])
    const any = generateCanti(request)
    expect(any.ok && any.value.count > made.value.count).toBe(true)
  },
)

/** Every melody of a small world, judged one by one. */
function countByHand(ruleSet: RuleSet, notes: readonly Pitch[], length: number): number {
  let melodies: (readonly Pitch[])[] = [[]]
  for (let bar = 0; bar < length; bar += 1) {
    melodies = melodies.flatMap((melody) => notes.map((note) => [...melody, note]))
  }
  return melodies.filter((cantus) =>
    judge(cantus, 'dorian', 'D', ruleSet).every(({ level }) => level !== 'law'),
  ).length
}

test.each(['open-undergrad', 'fux-mann'])(
  'counts as many canti firmi as there are in a small world, by %s',
  (id) => {
    const ruleSet = preset(id)
    const notes = scaleBetween('dorian', pitchClassOf('D'), pitchOf('C4'), pitchOf('G4'))
    const made = generateCanti({
      mode: 'dorian',
      final: pitchClassOf('D'),
      ruleSet,
      seed: 1,
      length: 5,
      compass: { lowest: 'C4', highest: 'G4' },
    })
    expect(made.ok && made.value.isExact && Number(made.value.count)).toBe(countByHand(ruleSet, notes, 5))
  },
)

test(`the draw is even: every cantus of a small world comes as often as any other (seed ${SEED})`, () => {
  const made = generateCanti({
    mode: 'dorian',
    final: pitchClassOf('D'),
    ruleSet: preset('open-undergrad'),
    seed: SEED,
    times: 20_000,
    length: 6,
    compass: { lowest: 'C4', highest: 'G4' },
  })
  if (!made.ok) throw new Error(made.reason.message)
  const seen = new Map<string, number>()
  for (const cantus of made.value.canti) {
    const name = cantus.map(formatPitch).join(' ')
    seen.set(name, (seen.get(name) ?? 0) + 1)
  }
  const kinds = Number(made.value.count)
  expect(seen.size).toBe(kinds)
  const fair = 20_000 / kinds
  const chiSquare = [...seen.values()].reduce((sum, times) => sum + (times - fair) ** 2 / fair, 0)
  // Mean kinds − 1, standard deviation the root of twice that; five of them is one chance in millions.
  expect(chiSquare).toBeLessThan(kinds - 1 + 5 * Math.sqrt(2 * (kinds - 1)))
})

test('a cantus lies in the compass asked for', () => {
  const made = generateCanti({
    mode: 'aeolian',
    final: pitchClassOf('F#'),
    ruleSet: preset('open-undergrad'),
    seed: 3,
    times: 50,
    compass: { lowest: 'E3', highest: 'B3' },
  })
  if (!made.ok) throw new Error(made.reason.message)
  for (const pitch of made.value.canti.flat()) {
    expect(comparePitches(pitch, pitchOf('E3'))).toBeGreaterThanOrEqual(0)
    expect(comparePitches(pitch, pitchOf('B3'))).toBeLessThanOrEqual(0)
  }
})

test.each([
  ['too short', { length: 2 }, 'bad-length'],
  ['too long', { length: 41 }, 'bad-length'],
  ['no whole number of bars', { length: 8.5 }, 'bad-length'],
  ['a mode nobody can spell', { mode: 'lydian', final: 'B##' }, 'no-spelling'],
  ['a compass without the final', { compass: { lowest: 'E4', highest: 'G4' } }, 'impossible'],
] as const)('%s is refused in words', (_name, change, code) => {
  const { final = 'D', ...rest } = { final: undefined, ...change } as { final?: string }
  const made = generateCanti({
    mode: 'dorian',
    ruleSet: preset('open-undergrad'),
    seed: 1,
    ...rest,
    final: pitchClassOf(final),
  })
  expect(made).toMatchObject({ ok: false, reason: { code } })
  if (!made.ok) expect(made.reason.message).toMatch(/^[A-Z].*\.$/)
})

test('a cantus of forty notes is made too', () => {
  const made = generateCanti({
    mode: 'dorian',
    final: pitchClassOf('D'),
    ruleSet: preset('open-undergrad'),
    seed: 1,
    length: 40,
  })
  expect(made.ok && made.value.canti[0]).toHaveLength(40)
})

test(`solutions over canti of our own making break no law (seed ${SEED})`, () => {
  const ruleSet = createCore1({ lowest: 'C4', highest: 'D6' })
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 2 ** 31 - 1 }), (seed) => {
      const made = generateCanti({
        mode: 'dorian',
        final: pitchClassOf('D'),
        ruleSet: preset('jeppesen-16c'),
        seed,
        length: 8,
        isTasteful: true,
      })
      if (!made.ok) throw new Error(made.reason.message)
      const exercise = readExercise({
        cantus: (made.value.canti[0] as readonly Pitch[]).map(formatPitch),
        mode: 'dorian',
        final: 'D',
        species: 1,
        position: 'above',
      })
      const solved = generateSolutions(exercise, ruleSet, { seed, times: 5 })
      if (!solved.ok) return
      for (const line of solved.value.lines) expect(checkLine(exercise, line, ruleSet)).toEqual([])
    }),
    { seed: SEED, numRuns: 8 },
  )
})

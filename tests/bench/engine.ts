/** E1 and E2: what judging a line and a wall of proposals costs, in this process, on one core. */
import { createChecker, findPreset, readExercise, RULES, type RuleSet } from '@/shared/rules'
import type { Line } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'
import type { BenchGroup, BenchRow } from './row'

const RUNS = 25
const BARS = 12
const PROPOSALS = 500

/** Fux's cantus on F, twelve bars, and his line above it (Gradus ad Parnassum, 1725; figure 13). */
const EXERCISE = readExercise({
  cantus: 'F3 G3 A3 F3 D3 E3 F3 C4 A3 F3 G3 F3'.split(' '),
  mode: 'lydian',
  final: 'F',
  species: 1,
  position: 'above',
})
const FUX_LINE = 'F4 E4 C4 F4 F4 G4 A4 G4 C4 F4 E4 F4'.split(' ')
const LADDER: readonly PitchName[] = 'C4 D4 E4 F4 G4 A4 B4 C5 D5 E5 F5'.split(' ')

const whole = (pitch: PitchName) => [{ pitch, ticks: 1920 }]
const lineOf = (names: readonly PitchName[]): Line =>
  Object.fromEntries(names.map((name, index) => [index + 1, whole(name)]))

/** Numbers below `count`, the same in every run: a Lehmer generator with a fixed seed. */
function createDraw(): (count: number) => number {
  let state = 20_261
  return (count) => {
    state = (state * 48_271) % 2_147_483_647
    return state % count
  }
}

/** Fux's line and ninety-nine departures from it, one to three notes changed: what a class would write. */
function createLines(): readonly Line[] {
  const draw = createDraw()
  return Array.from({ length: 100 }, (_, index) => {
    const names = [...FUX_LINE]
    for (let change = 0; change < index % 4; change += 1) {
      names[draw(BARS)] = LADDER[draw(LADDER.length)] as PitchName
    }
    return lineOf(names)
  })
}

/**
 * Microseconds of processor time that some work takes, a call. The work is nothing but arithmetic, so its own time is
 * the figure; the clock on the wall would count whatever else the machine is doing.
 */
function timeOf(calls: number, work: (call: number) => void): number {
  const startedAt = process.cpuUsage()
  for (let call = 0; call < calls; call += 1) work(call)
  const { user, system } = process.cpuUsage(startedAt)
  return (user + system) / calls
}

const WARM_UPS = 15

/** One figure a run; the first runs, while the engine warms up, are not counted. */
function sample(run: () => number): readonly number[] {
  for (let warmUp = 0; warmUp < WARM_UPS; warmUp += 1) run()
  return Array.from({ length: RUNS }, run)
}

function measureCheck(ruleSet: RuleSet): readonly number[] {
  const checker = createChecker(EXERCISE, ruleSet)
  const lines = createLines()
  return sample(() => timeOf(500, (call) => checker.checkLine(lines[call % lines.length] as Line)))
}

/** Proposals of `span` bars each, drawn from the ladder; a class on one bar repeats itself, one on four bars does not. */
function createProposals(span: number): readonly Line[] {
  const draw = createDraw()
  return Array.from({ length: PROPOSALS }, () => {
    const first = 3 + draw(BARS - 2 - span)
    return Object.fromEntries(
      Array.from({ length: span }, (_, index) => [
        first + index,
        whole(LADDER[draw(LADDER.length)] as PitchName),
      ]),
    )
  })
}

function measureWall(
  ruleSet: RuleSet,
  span: number,
): Readonly<{ samples: readonly number[]; kinds: number }> {
  const checker = createChecker(EXERCISE, ruleSet)
  const proposals = createProposals(span)
  const lines = createLines()
  let turn = 0
  // Every call a different agreed line, so that nothing can be left over from the call before.
  const nextLine = (): Line => lines[(turn += 1) % lines.length] as Line
  const samples = sample(() => timeOf(10, () => checker.annotate(nextLine(), proposals)) / 1000)
  return { samples, kinds: new Set(proposals.map((proposal) => JSON.stringify(proposal))).size }
}

export const runBench: BenchGroup = async (tell) => {
  const openUndergrad = findPreset('open-undergrad') as RuleSet
  const everything: RuleSet = {
    id: 'everything',
    name: 'Everything',
    rules: Object.fromEntries(RULES.map(({ id }) => [id, { level: 'law' }])),
  }
  tell('checking lines of twelve bars')
  const rows: BenchRow[] = [
    {
      line: 'E1',
      work: 'check a line of 12 bars, open-undergrad, every rule (CPU time)',
      samples: measureCheck(openUndergrad),
      unit: 'µs',
      goal: 'under 50 µs',
    },
    {
      line: 'E1',
      work: `the same, all ${RULES.length} rules switched on`,
      samples: measureCheck(everything),
      unit: 'µs',
      goal: 'to compare',
    },
  ]
  for (const span of [1, 3]) {
    tell(`annotating ${PROPOSALS} proposals of ${span === 1 ? 'one bar' : `${span} bars`}`)
    const { samples, kinds } = measureWall(openUndergrad, span)
    rows.push({
      line: 'E2',
      work: `${PROPOSALS} proposals of ${span} bar${span === 1 ? '' : 's'} (${kinds} kinds) when a note changes (CPU time)`,
      samples,
      unit: 'ms',
      goal: span === 1 ? 'under 2 ms' : 'to compare',
    })
  }
  return rows
}

/** E3 to E5: what finding every way to finish costs, beside an answer-set solver's own reckoning of its time. */
import { createCore1, PRESETS, readExercise, type Exercise, type Species } from '@/shared/rules'
import { createCore2 } from '@/shared/rules/presets/core-2'
import { createSearch } from '@/shared/search'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'
import { CLINGO_MISSING, hasClingo, runClingo } from '@/tests/support/clingo'
import type { BenchGroup, BenchRow } from './row'

const RUNS = 25
const WARM_UPS = 10

const POSITIONS = [
  { position: 'above', lo: 'C4', hi: 'C6' },
  { position: 'below', lo: 'F2', hi: 'G4' },
] as const

const CASES = FUX_CANTI.flatMap(({ notes, mode, final }) =>
  POSITIONS.map((where) => ({ cantus: notes.split(' '), mode, final, ...where })),
)
type Case = (typeof CASES)[number]

const exerciseOf = ({ cantus, mode, final, position }: Case, species: Species): Exercise =>
  readExercise({ cantus, mode, final, position, species })

/** Milliseconds of processor time: the work is arithmetic alone, and the machine may be doing something else. */
function timeOf(work: () => void): number {
  const startedAt = process.cpuUsage()
  work()
  const { user, system } = process.cpuUsage(startedAt)
  return (user + system) / 1000
}

/** An exact rule set: its line in the goals, and what is aimed at. */
type Exact = Readonly<{
  line: string
  id: 'core-1' | 'core-2'
  species: Species
  goal: string
  timesGoal: string
}>
const CORE_1: Exact = { line: 'E3', id: 'core-1', species: 1, goal: 'under 3 ms', timesGoal: '20 times' }
const CORE_2: Exact = { line: 'E4', id: 'core-2', species: 2, goal: 'under 40 ms', timesGoal: '100 times' }

function measureExact(exact: Exact, tell: (progress: string) => void): readonly BenchRow[] {
  const { line, id, species, goal, timesGoal } = exact
  /** From nothing to the number and all alive notes: rules read, automata begun, graph built. */
  const find = (given: Case): void => {
    const createSet = id === 'core-1' ? createCore1 : createCore2
    const ruleSet = createSet({ lowest: given.lo, highest: given.hi })
    createSearch(exerciseOf(given, species), ruleSet).find().alive()
  }
  tell(`${id} over Fux's six canti firmi, above and below`)
  for (let warmUp = 0; warmUp < WARM_UPS; warmUp += 1) CASES.forEach(find)
  const byCase = CASES.map((given) => Array.from({ length: RUNS }, () => timeOf(() => find(given))))
  const sums = Array.from({ length: RUNS }, (_, run) =>
    byCase.reduce((sum, times) => sum + (times[run] ?? 0), 0),
  )
  const slowest = [...byCase].sort((a, b) => medianOf(b) - medianOf(a))[0] ?? []
  const rows: BenchRow[] = [
    {
      line,
      work: `count and alive notes, ${id}, the slowest of 12 cases (CPU time)`,
      samples: slowest,
      unit: 'ms',
      goal,
    },
  ]
  if (!hasClingo()) {
    tell(CLINGO_MISSING)
    return rows
  }
  tell('the same by clingo')
  const clingo = CASES.map((given) => runClingo(id, given, 'count').seconds * 1000)
  const clingoSum = clingo.reduce((sum, time) => sum + time, 0)
  return [
    ...rows,
    {
      line,
      work: `${id}, all 12 by clingo, its own time`,
      samples: [clingoSum],
      unit: 'ms',
      goal: 'the peer',
    },
    {
      line,
      work: `${id}, all 12, how many times faster than clingo`,
      samples: sums.map((sum) => clingoSum / sum),
      unit: '×',
      goal: timesGoal,
    },
  ]
}

const GOALS_MS: Readonly<Record<Species, number>> = { 1: 10, 2: 100, 3: 800, 4: 50, 5: 1500 }

function measurePresets(species: Species, tell: (progress: string) => void): readonly BenchRow[] {
  tell(`full presets, species ${species}`)
  return PRESETS.map((ruleSet): BenchRow => {
    const find = (given: Case) => createSearch(exerciseOf(given, species), ruleSet).find()
    const cases = CASES.slice(0, 2)
    // The larger species take seconds together: they are run fewer times.
    const runs = species === 5 ? 1 : 3
    if (species !== 5) cases.forEach(find)
    const samples = cases.flatMap((given) => Array.from({ length: runs }, () => timeOf(() => find(given))))
    return {
      line: 'E5',
      work: `count, ${ruleSet.id}, species ${species}, eleven bars above and below (CPU time)`,
      samples,
      unit: 'ms',
      goal: `under ${GOALS_MS[species]} ms`,
    }
  })
}

const medianOf = (samples: readonly number[]): number =>
  [...samples].sort((a, b) => a - b)[samples.length >> 1] ?? 0

export const runBench: BenchGroup = (tell) =>
  Promise.resolve([
    ...measureExact(CORE_1, tell),
    ...measureExact(CORE_2, tell),
    ...([1, 2, 3, 4, 5] as const).flatMap((species) => measurePresets(species, tell)),
  ])

/**
 * Prints what the groups named on the command line measured, or all groups, as one table. Asserts nothing: machines
 * are shared and noisy, and a figure is for reading beside its goal. `npm run bench -- engine lesson`
 */
import { formatTable } from './table'
import type { BenchGroup, BenchRow } from './row'

const GROUPS: Readonly<Record<string, () => Promise<{ runBench: BenchGroup }>>> = {
  engine: () => import('./engine'),
  search: () => import('./search'),
  generate: () => import('./generate'),
  lesson: () => import('./lesson'),
  client: () => import('./client'),
  startup: () => import('./startup'),
}

const asked = process.argv.slice(2)
const unknown = asked.filter((name) => !(name in GROUPS))
if (unknown.length > 0) {
  console.error(`There is no group ${unknown.join(', ')}. There are: ${Object.keys(GROUPS).join(', ')}.`)
  process.exit(2)
}

async function main(): Promise<void> {
  const rows: BenchRow[] = []
  const failures: string[] = []
  for (const name of asked.length > 0 ? asked : Object.keys(GROUPS)) {
    const tell = (progress: string) => process.stderr.write(`${name}: ${progress}\n`)
    try {
      const load = GROUPS[name] as () => Promise<{ runBench: BenchGroup }>
      const { runBench } = await load()
      rows.push(...(await runBench(tell)))
    } catch (error) {
      // One group that cannot run (no Chromium, no clingo) must not cost the figures of the others.
      failures.push(
        `${name} could not be measured: ${error instanceof Error ? error.message : String(error)}`,
      )
    }
  }
  if (rows.length > 0) console.log(formatTable(rows))
  for (const failure of failures) console.error(failure)
  process.exit(failures.length > 0 ? 1 : 0)
}

void main()

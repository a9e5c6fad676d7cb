/** `npm run theory -- …`: the rules and the search from the command line. Needs no server and no database. */
import { readFileSync, statSync } from 'node:fs'
import { Refusal } from '@/server/theory/refusal'
import { runTheory } from '@/server/theory/run-theory'

const MOST_BYTES = 4_000_000

function readFile(path: string): string {
  try {
    if (statSync(path).size > MOST_BYTES) throw new Refusal(`${path} is larger than ${MOST_BYTES} bytes.`)
    return readFileSync(path, 'utf8')
  } catch (error) {
    if (error instanceof Refusal) throw error
    throw new Refusal(`${path} could not be read.`)
  }
}

const { out, error, exitCode } = runTheory(process.argv.slice(2), readFile)
process.stderr.write(error)
process.stdout.write(out)
process.exitCode = exitCode

import { alive, check, count, draw, solve, type Answer } from '@/server/theory/answers'
import { generate } from '@/server/theory/generate'
import { HELP } from '@/server/theory/help'
import { readAsked } from '@/server/theory/read-exercise'
import { Refusal } from '@/server/theory/refusal'
import { parseRequest, type Request } from '@/server/theory/request'

/** What the command prints, and how it ends. */
export type Outcome = Readonly<{ out: string; error: string; exitCode: number }>

/** Answers a command line. `readFile` gives the text of a file, or throws a refusal. */
export function runTheory(argv: readonly string[], readFile: (path: string) => string): Outcome {
  try {
    const request = parseRequest(argv)
    if (request === null) return { out: `${HELP}\n`, error: '', exitCode: 0 }
    const { text, json } = answer(request, readFile)
    return { out: `${request.values.json ? JSON.stringify(json) : text}\n`, error: '', exitCode: 0 }
  } catch (error) {
    if (!(error instanceof Refusal)) throw error
    return { out: '', error: `${error.message}\n`, exitCode: 2 }
  }
}

function answer(request: Request, readFile: (path: string) => string): Answer {
  const { command, values } = request
  switch (command) {
    case 'check':
      return check(readAsked(request, readFile))
    case 'count':
      return count(readAsked(request, readFile))
    case 'alive':
      return alive(readAsked(request, readFile))
    case 'solve':
      return solve(readAsked(request, readFile), values)
    case 'draw':
      return draw(readAsked(request, readFile), values)
    case 'generate':
      return generate(request, readFile)
  }
}

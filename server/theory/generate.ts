import { readSeed, writeFinding, type Answer } from '@/server/theory/answers'
import { readAsked, readCompass, readTonality } from '@/server/theory/read-exercise'
import { readRuleSet, USUAL_RULES } from '@/server/theory/read-rule-set'
import { accept, Refusal } from '@/server/theory/refusal'
import { readChoice, readNumber, type Request } from '@/server/theory/request'
import {
  generateCanti,
  generateSolutions,
  LEAST_CANTUS_BARS,
  MOST_CANTUS_BARS,
  MOST_FAULTS,
  prepareFaults,
  USUAL_APART,
  USUAL_CANTUS_BARS,
  type Fault,
} from '@/shared/generate'
import { formatCantusWords, formatLineText } from '@/shared/interchange'
import { describeFinding } from '@/shared/rules'

const KINDS = ['cantus', 'solution', 'faults'] as const
const MOST_TIMES = 10_000
const FAULT_GRAMMAR = /^([a-z0-9-]+)(?:\/([a-z0-9-]+))?(?::(\d))?$/

/** `generate cantus`, `generate solution "D4 …"`, `generate faults --fault par-perfect:2 "D4 …"`. */
export function generate(request: Request, readFile: (path: string) => string): Answer {
  const [kind, ...words] = request.words
  if (kind === undefined) throw new Refusal(`Say what to generate: ${KINDS.join(', ')}.`)
  const rest = { ...request, words }
  switch (readChoice('generate', kind, KINDS, 'cantus')) {
    case 'cantus':
      return cantus(rest, readFile)
    case 'solution':
      return solution(rest, readFile)
    case 'faults':
      return faults(rest, readFile)
  }
}

const readTimes = ({ values }: Request): number =>
  readNumber('times', values.times, { least: 1, most: MOST_TIMES, usual: 1 })

function cantus(request: Request, readFile: (path: string) => string): Answer {
  const { values, words } = request
  if (words.length > 0) throw new Refusal('generate cantus wants no melody; it makes one.')
  const compass = readCompass(values)
  const seed = readSeed(values.seed)
  const { canti, count, isExact } = accept(
    generateCanti({
      ...readTonality({ ...values, mode: values.mode ?? 'dorian', final: values.final ?? 'D' }, []),
      ruleSet: readRuleSet(values.rules ?? USUAL_RULES, compass, readFile),
      seed,
      times: readTimes(request),
      length: readNumber('length', values.length, {
        least: LEAST_CANTUS_BARS,
        most: MOST_CANTUS_BARS,
        usual: USUAL_CANTUS_BARS,
      }),
      compass,
      isTasteful: values.taste ?? false,
    }),
  )
  const written = canti.map(formatCantusWords)
  return { text: written.join('\n'), json: { seed, count: String(count), isExact, canti: written } }
}

function solution(request: Request, readFile: (path: string) => string): Answer {
  const { exercise, ruleSet, line, setAside, compass } = readAsked(request, readFile)
  const seed = readSeed(request.values.seed)
  const { lines, count, isExact } = accept(
    generateSolutions(exercise, ruleSet, {
      seed,
      times: readTimes(request),
      setAside,
      compass,
      question: { line },
    }),
  )
  const written = lines.map((one) => formatLineText(one, exercise.cantus.length))
  return { text: written.join('\n'), json: { seed, count: String(count), isExact, lines: written } }
}

function faults(request: Request, readFile: (path: string) => string): Answer {
  const { values } = request
  if (values.line !== undefined || values.aside !== undefined) {
    throw new Refusal('generate faults writes the whole line; leave --line and --aside out.')
  }
  const { exercise, ruleSet, compass } = readAsked(request, readFile)
  const seed = readSeed(values.seed)
  const apart = readNumber('apart', values.apart, { least: 0, most: MOST_CANTUS_BARS, usual: USUAL_APART })
  const asked = readFaults(values.fault ?? [])
  const source = accept(prepareFaults({ exercise, ruleSet, faults: asked, apart, compass }))
  const made = Array.from({ length: readTimes(request) }, (_, turn) => accept(source.draw(seed + turn)))
  const exercises = made.map(({ line, answerKey }) => ({
    line: formatLineText(line, exercise.cantus.length),
    answerKey: answerKey.map(writeFinding),
  }))
  const text = made.map(({ answerKey }, index) => {
    const key = answerKey.map((finding) => {
      const { heading, sentence } = describeFinding(finding)
      return `  ${heading}: ${sentence} [${finding.ruleId}]`
    })
    return [exercises[index]?.line, ...key].join('\n')
  })
  return {
    text: text.join('\n'),
    json: { seed, count: String(source.count), isExact: source.isExact, exercises },
  }
}

/** `par-perfect`, `par-perfect:2`, and `par-perfect/fifths:2` where one message of a rule is meant. */
function readFaults(texts: readonly string[]): readonly Fault[] {
  if (texts.length === 0)
    throw new Refusal('Say which faults: --fault par-perfect, or --fault par-perfect:2.')
  return texts.map((text) => {
    const match = FAULT_GRAMMAR.exec(text)
    if (!match) {
      throw new Refusal(
        `--fault wants a rule and a number up to ${MOST_FAULTS}, as par-perfect:2, not ${text}.`,
      )
    }
    const [, rule = '', code, times] = match
    return { rule, times: times === undefined ? 1 : Number(times), ...(code === undefined ? {} : { code }) }
  })
}

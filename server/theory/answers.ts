import type { Asked } from '@/server/theory/read-exercise'
import { readChoice, readNumber, type Request } from '@/server/theory/request'
import { formatLineText } from '@/shared/interchange'
import { createChecker, describeFinding, type Finding } from '@/shared/rules'
import { createSearch, type AliveNotes, type DeadEnd, type Ways } from '@/shared/search'
import { QUARTER_TICKS } from '@/shared/theory/duration'

/** What a command has to say, for people and for programs. */
export type Answer = Readonly<{ text: string; json: unknown }>

const MOST_LINES = 100_000

/** Judges the line, or the cantus alone where no line is given. */
export function check({ exercise, ruleSet, line, hasLine, setAside }: Asked): Answer {
  const checker = createChecker(exercise, ruleSet)
  const findings = hasLine ? checker.checkLine(line, setAside) : checker.checkCantus()
  return {
    text:
      findings.length === 0 ? 'Nothing found.' : findings.map((finding) => sayFinding(finding)).join('\n'),
    json: { findings: findings.map(writeFinding) },
  }
}

function sayFinding(finding: Finding): string {
  const { heading, sentence, mend } = describeFinding(finding)
  return `${finding.level === 'law' ? 'Law' : 'Remark'}. ${heading}: ${sentence} ${mend} [${finding.ruleId}]`
}

/** A finding as programs are given it. */
export function writeFinding(finding: Finding) {
  const { heading, sentence, mend } = describeFinding(finding)
  const { ruleId, level, voice, code, bars, notes, args } = finding
  return { rule: ruleId, level, voice, code, bars, notes, args, heading, sentence, mend }
}

/** How many ways there are to finish the line, and through which notes. */
export function count(asked: Asked): Answer {
  const ways = findWays(asked)
  return {
    text: `${sayCount(ways)}${sayDeadEnd(ways.deadEnd)}`,
    json: { ...writeWays(ways), alive: writeAlive(ways, asked) },
  }
}

/** The notes that still lead to an end, bar by bar. */
export function alive(asked: Asked): Answer {
  const ways = findWays(asked)
  const slots = writeAlive(ways, asked)
  const lines = slots.map(({ bar, beat, notes }) => {
    const list = Object.entries(notes).map(([name, ways]) => `${name} ${ways}`)
    return `Bar ${bar}${beat === undefined ? '' : `, beat ${beat}`}: ${list.join(', ')}`
  })
  return {
    text: [`${sayCount(ways)}${sayDeadEnd(ways.deadEnd)}`, ...lines].join('\n'),
    json: { ...writeWays(ways), alive: slots },
  }
}

/** Whole lines: those the preferences like best, or all in the order of their notes. */
export function solve(asked: Asked, { limit, order }: Request['values']): Answer {
  const most = readNumber('limit', limit, { least: 1, most: MOST_LINES, usual: 10 })
  const ways = findWays(asked)
  const isBest = readChoice('order', order, ['best', 'notes'], 'best') === 'best'
  const solutions = isBest ? bestOf(ways, asked, most) : firstOf(ways, asked, most)
  return {
    text: [
      `${sayCount(ways)}${sayDeadEnd(ways.deadEnd)}`,
      ...solutions.map(({ line, cost }) => `${line}${cost ? `   (${cost} remarks)` : ''}`),
    ].join('\n'),
    json: { ...writeWays(ways), solutions },
  }
}

type Solution = Readonly<{ line: string; cost?: number }>

const bestOf = (ways: Ways, { exercise }: Asked, most: number): readonly Solution[] =>
  ways.count === 0n
    ? []
    : ways
        .best(most)
        .lines.map(({ line, cost }) => ({ line: formatLineText(line, exercise.cantus.length), cost }))

function firstOf(ways: Ways, { exercise }: Asked, most: number): readonly Solution[] {
  const solutions: Solution[] = []
  if (most === 0) return solutions
  for (const line of ways.solutions()) {
    solutions.push({ line: formatLineText(line, exercise.cantus.length) })
    if (solutions.length === most) break
  }
  return solutions
}

/** Lines drawn evenly from all there are. */
export function draw(asked: Asked, { seed, times }: Request['values']): Answer {
  const howMany = readNumber('times', times, { least: 1, most: MOST_LINES, usual: 1 })
  const seedNumber = readSeed(seed)
  const ways = findWays(asked)
  const lines = ways
    .draw(seedNumber, howMany)
    .map((line) => formatLineText(line, asked.exercise.cantus.length))
  return {
    text: lines.length === 0 ? `${sayCount(ways)}${sayDeadEnd(ways.deadEnd)}` : lines.join('\n'),
    json: { ...writeWays(ways), seed: seedNumber, lines },
  }
}

export const readSeed = (seed: string | undefined): number =>
  readNumber('seed', seed, { least: 0, most: 999_999_999, usual: 1 })

const findWays = ({ exercise, ruleSet, line, setAside, compass }: Asked): Ways =>
  createSearch(exercise, ruleSet, { setAside, compass }).find({ line })

const writeWays = ({ count: ways, isExact, deadEnd }: Ways) => ({ count: String(ways), isExact, deadEnd })

const sayCount = ({ count: ways, isExact }: Ways): string => {
  if (!isExact) return `Too many to count in the time given: at least ${ways} ways.`
  return ways === 1n ? 'One way.' : `${ways} ways.`
}

function sayDeadEnd(deadEnd: DeadEnd | null): string {
  if (deadEnd === null) return ''
  const { bar, rules, because } = deadEnd
  return because === 'rhythm'
    ? ` What is written in bar ${bar} has no place in the rhythm of the species.`
    : ` No note is left for bar ${bar}, by ${rules.join(', ')}.`
}

type Slot = Readonly<{ bar: number; beat?: number; notes: Readonly<Record<string, string>> }>

/**
 * Alive notes by slot: pitches with the number of solutions that have them there, `R` for a rest, and `-` for those in
 * which nothing begins at that place. The beat is told where a bar has more than one note.
 */
function writeAlive(ways: Ways, { exercise }: Asked): readonly Slot[] {
  return ways.alive().map((slot) => {
    const { bar, place, notes } = slot
    const written = sumByPitch(notes, ways.count)
    return exercise.species === 1
      ? { bar, notes: written }
      : { bar, beat: place / QUARTER_TICKS + 1, notes: written }
  })
}

function sumByPitch(notes: AliveNotes['notes'], total: bigint): Readonly<Record<string, string>> {
  const sums = new Map<string, bigint>()
  let begun = 0n
  for (const { pitch, count: ways } of notes) {
    const name = pitch ?? 'R'
    sums.set(name, (sums.get(name) ?? 0n) + ways)
    begun += ways
  }
  if (begun < total) sums.set('-', total - begun)
  return Object.fromEntries([...sums].map(([name, ways]) => [name, String(ways)]))
}

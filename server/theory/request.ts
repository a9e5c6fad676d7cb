import { parseArgs } from 'node:util'
import { Refusal } from '@/server/theory/refusal'

export const COMMANDS = ['check', 'count', 'alive', 'solve', 'draw', 'generate'] as const
export type Command = (typeof COMMANDS)[number]

const OPTIONS = {
  species: { type: 'string' },
  rules: { type: 'string' },
  mode: { type: 'string' },
  final: { type: 'string' },
  position: { type: 'string' },
  low: { type: 'string' },
  high: { type: 'string' },
  cantus: { type: 'string' },
  line: { type: 'string' },
  aside: { type: 'string' },
  seed: { type: 'string' },
  times: { type: 'string' },
  limit: { type: 'string' },
  order: { type: 'string' },
  length: { type: 'string' },
  taste: { type: 'boolean' },
  fault: { type: 'string', multiple: true },
  apart: { type: 'string' },
  json: { type: 'boolean' },
  help: { type: 'boolean', short: 'h' },
} as const

type Values = ReturnType<typeof parseArgs<{ options: typeof OPTIONS; allowPositionals: true }>>['values']

/** What was asked on the command line, as words. */
export type Request = Readonly<{ command: Command; words: readonly string[]; values: Values }>

/** Reads a command line; `null` where help is asked for. */
export function parseRequest(argv: readonly string[]): Request | null {
  const { values, positionals } = parse(argv)
  const [command, ...words] = positionals
  if (values.help || command === undefined || command === 'help') return null
  if (!isCommand(command)) {
    throw new Refusal(`There is no command ${command}; there are ${COMMANDS.join(', ')}.`)
  }
  return { command, words, values }
}

function parse(argv: readonly string[]) {
  try {
    return parseArgs({ args: [...argv], options: OPTIONS, allowPositionals: true })
  } catch (error) {
    const [sentence = 'The command line could not be read.'] = (error as Error).message.split(/\. |\n/)
    throw new Refusal(`${sentence.replace(/\.$/, '')}.`)
  }
}

const isCommand = (text: string): text is Command => (COMMANDS as readonly string[]).includes(text)

/** A whole number between two others, or what stands for it where the option is not given. */
export function readNumber(
  name: string,
  text: string | undefined,
  { least, most, usual }: Readonly<{ least: number; most: number; usual: number }>,
): number {
  if (text === undefined) return usual
  const number = /^\d{1,9}$/.test(text) ? Number(text) : NaN
  if (!(number >= least && number <= most)) {
    throw new Refusal(`--${name} wants a whole number from ${least} to ${most}, not ${text}.`)
  }
  return number
}

/** One of a few words. */
export function readChoice<Word extends string>(
  name: string,
  text: string | undefined,
  words: readonly Word[],
  usual: Word,
): Word {
  if (text === undefined) return usual
  const word = words.find((known) => known === text)
  if (word === undefined) throw new Refusal(`--${name} wants one of ${words.join(', ')}, not ${text}.`)
  return word
}

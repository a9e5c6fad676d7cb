import { formatNotes } from '@/shared/board'
import type { BarNotes, Line } from '@/shared/theory/note'

/** The line with other notes laid over some of its bars. */
export const lineWith = (line: Line, over: Line): Line => ({ ...line, ...over })

/** The line with some of its bars unwritten. */
export function lineWithout(line: Line, bars: Iterable<number>): Line {
  const rest: Record<number, BarNotes> = { ...line }
  for (const bar of bars) delete rest[bar]
  return rest
}

export const barsOf = (line: Line): readonly number[] =>
  Object.keys(line)
    .map(Number)
    .sort((a, b) => a - b)

/** Notes as a short text; equal texts mean the same notes, spelling and lengths included. */
export const identityOfNotes = formatNotes

/** Some bars of a line as a short text: `6=C5/1920|7=E5/1920`. */
export const identityOfLine = (line: Line): string =>
  barsOf(line)
    .map((bar) => `${bar}=${identityOfNotes(line[bar] ?? [])}`)
    .join('|')

import { quote, type ReadingProblem } from '@/shared/interchange/reading-problem'
import { fail, ok, type Result } from '@/shared/result'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line, Note } from '@/shared/theory/note'
import { formatPitch, parsePitch, type Pitch } from '@/shared/theory/pitch'

/** Most characters of a melody in words: forty bars of eighths with room to spare. */
export const MAX_TEXT_CHARACTERS = 8_000

const TOKEN = /^(r|[A-G](?:##|#|bb|b)?[0-8])(?::(\d{1,2}(?:\.\d{1,4})?))?(~)?$/
/** The shortest value anybody writes in fifth species. */
const GRID_TICKS = QUARTER_TICKS / 2

const problem = (code: ReadingProblem['code'], message: string) => fail({ code, message })

/**
 * Reads a line in words: notes with their lengths in quarters (`A4:2`, a whole note where none is given), `r` for a
 * rest, `~` after a note that is tied to the next, `|` between bars, nothing or `.` in a bar that is unwritten. Without
 * any `|`, a bar ends where it is full.
 * @example parseLineText('r:2 D4:2~ | D4:2 C4:2 | D4:4')
 */
export function parseLineText(text: string): Result<Line, ReadingProblem> {
  if (text.length > MAX_TEXT_CHARACTERS) {
    return problem('too-long', `The line has more than ${MAX_TEXT_CHARACTERS} characters.`)
  }
  const line: Record<number, readonly Note[]> = {}
  const bars = text.includes('|') ? splitAtStrokes(text) : [text]
  let bar = 0
  for (const words of bars) {
    const tokens = words.split(/[\s,]+/).filter((token) => token !== '')
    let notes: Note[] = []
    let filled = 0
    bar += 1
    for (const token of tokens) {
      if (token === '.' && notes.length === 0) {
        if (bars.length === 1) bar += 1
        continue
      }
      const note = parseNote(token, bar)
      if (!note.ok) return note
      filled += note.value.ticks
      if (filled > WHOLE_TICKS) {
        return problem('bar-overfull', `Bar ${bar} holds more than four quarters, at ${quote(token)}.`)
      }
      notes.push(note.value)
      if (bars.length === 1 && filled === WHOLE_TICKS) {
        line[bar] = notes
        notes = []
        filled = 0
        bar += 1
      }
    }
    if (notes.length > 0) line[bar] = notes
  }
  return checkTies(line)
}

/** A stroke before the first bar or after the last is an ornament. */
const splitAtStrokes = (text: string): readonly string[] =>
  text
    .trim()
    .replace(/^\||\|$/g, '')
    .split('|')

function parseNote(token: string, bar: number): Result<Note, ReadingProblem> {
  const match = TOKEN.exec(token)
  if (!match) {
    return problem(
      'not-a-note',
      `${quote(token)} in bar ${bar} is no note; a note is written like A4:2, a rest like r:2.`,
    )
  }
  const [, name = '', quarters, tie] = match
  const ticks = quarters === undefined ? WHOLE_TICKS : Number(quarters) * QUARTER_TICKS
  if (ticks <= 0 || ticks % GRID_TICKS !== 0) {
    return problem(
      'off-the-grid',
      `${quote(token)} in bar ${bar} is off the grid: lengths are counted in quarters, by halves of one.`,
    )
  }
  const pitch = name === 'r' ? null : name
  if (pitch === null && tie !== undefined) {
    return problem('no-such-tie', `${quote(token)} in bar ${bar}: a rest cannot be tied.`)
  }
  return ok(tie === undefined ? { pitch, ticks } : { pitch, ticks, tied: true })
}

function checkTies(line: Line): Result<Line, ReadingProblem> {
  for (const [key, notes] of Object.entries(line)) {
    const bar = Number(key)
    for (const [index, note] of notes.entries()) {
      if (!note.tied) continue
      // What is not written yet may still become the note that is tied to.
      const next = notes[index + 1] ?? line[bar + 1]?.[0]
      if (next !== undefined && next.pitch !== note.pitch) {
        return problem('no-such-tie', `${note.pitch} in bar ${bar} is tied to another note.`)
      }
    }
  }
  return ok(line)
}

/** Writes a line in words, up to its last bar or to `barCount`; the inverse of `parseLineText`. */
export function formatLineText(line: Line, barCount = lastBarOf(line)): string {
  return Array.from(
    { length: barCount },
    (_, index) => (line[index + 1] ?? []).map(formatNote).join(' ') || '.',
  ).join(' | ')
}

export const lastBarOf = (line: Line): number => Math.max(0, ...Object.keys(line).map(Number))

const formatNote = ({ pitch, ticks, tied }: Note): string =>
  `${pitch ?? 'r'}:${ticks / QUARTER_TICKS}${tied ? '~' : ''}`

/** Reads a cantus in words: one note a bar, `D4 F4 E4`; lengths may be given, if they are all alike, and are dropped. */
export function parseCantusWords(text: string): Result<readonly Pitch[], ReadingProblem> {
  if (text.length > MAX_TEXT_CHARACTERS) {
    return problem('too-long', `The cantus has more than ${MAX_TEXT_CHARACTERS} characters.`)
  }
  const tokens = text.split(/[\s,|]+/).filter((token) => token !== '')
  if (tokens.length === 0) return problem('empty', 'The cantus has no notes.')
  const notes: Note[] = []
  for (const [index, token] of tokens.entries()) {
    const note = parseNote(token, index + 1)
    if (!note.ok) return note
    notes.push(note.value)
  }
  return cantusOf(notes)
}

/** The pitches of notes that make a cantus: no rest, no tie, all of one length. */
export function cantusOf(notes: readonly Note[]): Result<readonly Pitch[], ReadingProblem> {
  const pitches: Pitch[] = []
  for (const [index, { pitch, ticks, tied }] of notes.entries()) {
    if (pitch === null) return problem('rest-in-cantus', `Note ${index + 1} of the cantus is a rest.`)
    if (ticks !== notes[0]?.ticks || tied) {
      return problem(
        'not-one-note-a-bar',
        `Note ${index + 1} of the cantus is of another length; a cantus has one note a bar.`,
      )
    }
    const parsed = parsePitch(pitch)
    if (!parsed.ok) return problem('not-a-note', `${quote(pitch)} in the cantus is no note.`)
    pitches.push(parsed.value)
  }
  return ok(pitches)
}

export const formatCantusWords = (cantus: readonly Pitch[]): string => cantus.map(formatPitch).join(' ')

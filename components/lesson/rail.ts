import type { BarMotion } from '@/shared/notation/score-input'
import type { Exercise } from '@/shared/rules'
import { QUARTER_TICKS } from '@/shared/theory/duration'
import { figureOf, intervalBetween, type Interval } from '@/shared/theory/interval'
import { motionBetween } from '@/shared/theory/motion'
import type { BarNotes, Line } from '@/shared/theory/note'
import { parsePitch, type Pitch } from '@/shared/theory/pitch'

/** What the two voices do at the start of a bar. */
export type RailEntry = Readonly<{
  interval: Interval | null
  figure: string | null
  /** Into this bar from the one read before it, across bars set aside. */
  motion: BarMotion | null
  /** Figures of what is struck later in the bar, by its place in ticks. */
  later: readonly Readonly<{ tick: number; text: string }>[]
}>

const pitchAt = (notes: BarNotes | undefined, place: 'first' | 'last'): Pitch | null => {
  const note = place === 'first' ? notes?.[0] : notes?.at(-1)
  if (!note?.pitch) return null
  const parsed = parsePitch(note.pitch)
  return parsed.ok ? parsed.value : null
}

/** The bar read before another, or null at the beginning. */
export function barReadBefore(bar: number, setAside: ReadonlySet<number>): number | null {
  for (let before = bar - 1; before >= 1; before -= 1) if (!setAside.has(before)) return before
  return null
}

/** Figure and motion of every bar, by index from 0. A bar set aside or unwritten has neither. */
export function railOf(exercise: Exercise, line: Line, setAside: ReadonlySet<number>): readonly RailEntry[] {
  return exercise.cantus.map((cantus, index) => {
    const bar = index + 1
    const note = setAside.has(bar) ? null : pitchAt(line[bar], 'first')
    const later = setAside.has(bar) ? [] : laterFigures(cantus, line[bar] ?? [])
    if (!note) return { interval: null, figure: null, motion: null, later }
    const interval = intervalBetween(cantus, note)
    const motion = motionInto(exercise, line, setAside, bar, note)
    return { interval, figure: figureOf(interval), motion, later }
  })
}

/** A figure for every note after the first; eighth notes are too quick for one of their own. */
function laterFigures(cantus: Pitch, notes: BarNotes): RailEntry['later'] {
  let tick = 0
  return notes.flatMap(({ pitch, ticks }) => {
    const at = tick
    tick += ticks
    if (at === 0 || pitch === null || ticks < QUARTER_TICKS) return []
    const parsed = parsePitch(pitch)
    return parsed.ok ? [{ tick: at, text: figureOf(intervalBetween(cantus, parsed.value)) }] : []
  })
}

/** The motion that a note in a bar would make from the bar read before it; null where nothing is written there. */
export function motionInto(
  exercise: Exercise,
  line: Line,
  setAside: ReadonlySet<number>,
  bar: number,
  note: Pitch,
): BarMotion | null {
  const before = barReadBefore(bar, setAside)
  const previous = before === null ? null : pitchAt(line[before], 'last')
  const previousCantus = before === null ? undefined : exercise.cantus[before - 1]
  const cantus = exercise.cantus[bar - 1]
  if (!previous || !previousCantus || !cantus) return null
  return motionBetween(previousCantus, cantus, previous, note)
}

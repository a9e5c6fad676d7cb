import type { Choice, Place } from '@/shared/search/place'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line, Note } from '@/shared/theory/note'

/** What is written in a bar: its notes, by where they begin, and how far they fill it. */
export type WrittenBar = Readonly<{ notes: ReadonlyMap<number, Note>; filled: number }>

/** The notes of a line that are already written, by bar. */
export type Written = ReadonlyMap<number, WrittenBar>

/** Reads what is written. A tie to another pitch holds nothing over, and is not read. */
export function readWritten(line: Line, bars: readonly number[]): Written {
  const written = new Map<number, WrittenBar>()
  for (const bar of bars) {
    const all = line[bar] ?? []
    const notes = new Map<number, Note>()
    let filled = 0
    for (const [index, note] of all.entries()) {
      const following =
        all[index + 1] ?? (filled + note.ticks >= WHOLE_TICKS ? line[bar + 1]?.[0] : undefined)
      const isTied = note.tied === true && (following === undefined || following.pitch === note.pitch)
      notes.set(filled, isTied ? note : { pitch: note.pitch, ticks: note.ticks })
      filled += note.ticks
    }
    if (notes.size > 0) written.set(bar, { notes, filled })
  }
  return written
}

/** The notes of a bar that is written from end to end, or `null`. */
export const wholeBar = (written: WrittenBar): readonly Note[] | null =>
  written.filled >= WHOLE_TICKS ? [...written.notes.values()] : null

/** True of a choice that writes nothing else where something is written. */
export function agrees(choice: Choice, written: Written): boolean {
  return choice.onsets.every(({ bar, place, pitch, ticks, isTied, isForeign }) => {
    const known = written.get(bar)
    if (known === undefined || place >= known.filled) return !isForeign
    const note = known.notes.get(place)
    if (note === undefined || note.pitch !== pitch || note.ticks !== ticks) return false
    return (note.tied === true) === isTied
  })
}

/** The choices of a place that agree with what is written, out of those that may be tried. */
export const narrow = ({ choices }: Place, tried: Uint16Array, written: Written): Uint16Array =>
  tried.filter((choice) => agrees(choices[choice] as Choice, written))

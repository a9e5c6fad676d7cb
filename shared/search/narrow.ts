import type { Choice, Place } from '@/shared/search/place'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line, Note } from '@/shared/theory/note'

/** The notes of a line that are already written, by where they stand. */
export type Written = ReadonlyMap<number, Readonly<{ notes: ReadonlyMap<number, Note>; filled: number }>>

export function readWritten(line: Line, bars: readonly number[]): Written {
  const written = new Map<number, { notes: Map<number, Note>; filled: number }>()
  for (const bar of bars) {
    const notes = new Map<number, Note>()
    let filled = 0
    for (const note of line[bar] ?? []) {
      notes.set(filled, note)
      filled += note.ticks
    }
    if (notes.size > 0) written.set(bar, { notes, filled: Math.min(filled, WHOLE_TICKS) })
  }
  return written
}

/** True of a choice that writes nothing else where something is written. */
export function agrees(choice: Choice, written: Written): boolean {
  return choice.onsets.every(({ bar, place, pitch, ticks, isTied }) => {
    const known = written.get(bar)
    if (known === undefined || place >= known.filled) return true
    const note = known.notes.get(place)
    if (note === undefined || note.pitch !== pitch || note.ticks !== ticks) return false
    return (note.tied === true) === isTied
  })
}

/** The choices of a place that agree with what is written, out of those that may be tried. */
export function narrow({ choices }: Place, tried: Uint16Array, written: Written): Uint16Array {
  if (written.size === 0) return tried
  return tried.filter((choice) => agrees(choices[choice] as Choice, written))
}

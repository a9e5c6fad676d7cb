/** A member's own acts, each one transaction of the sheet. Erasing writes `null`, so that it is acknowledged like a note. */
import type * as Y from 'yjs'
import type { BarNotes } from '@/shared/theory/note'
import type { Mark } from '@/shared/wire/documents'

/** Writes the notes of one bar, as of the bar's present round. */
export function writeSheetBar(doc: Y.Doc, bar: number, notes: BarNotes, round: number): void {
  const plain = notes.map(({ pitch, ticks, tied }) => (tied ? { pitch, ticks, tied } : { pitch, ticks }))
  doc.getMap<unknown>('notes').set(String(bar), { notes: plain, round })
}

export function eraseSheetBar(doc: Y.Doc, bar: number): void {
  const notes = doc.getMap<unknown>('notes')
  if (notes.get(String(bar)) != null) notes.set(String(bar), null)
}

export const writeMark = (doc: Y.Doc, mark: Mark): void => {
  doc.getMap<unknown>('marks').set(`${mark.kind}:${mark.bar}`, { kind: mark.kind, bar: mark.bar })
}

export function eraseMark(doc: Y.Doc, mark: Mark): void {
  const marks = doc.getMap<unknown>('marks')
  const key = `${mark.kind}:${mark.bar}`
  if (marks.get(key) != null) marks.set(key, null)
}

import type * as Y from 'yjs'
import { markSchema, sheetBarSchema } from '@/shared/wire/documents'
import type { SheetState } from './board-state'
import { readBars, readEntries } from './parse-value'

/** A member's sheet as plain values; an empty document is an empty sheet. Never throws. */
export const readSheet = (doc: Y.Doc): SheetState => ({
  notes: readBars(doc, 'notes', sheetBarSchema),
  marks: readEntries(doc, 'marks', markSchema)
    .filter(([key, mark]) => key === `${mark.kind}:${mark.bar}`)
    .map(([, mark]) => mark)
    .sort((a, b) => a.bar - b.bar || a.kind.localeCompare(b.kind)),
})

import { z } from 'zod'
import type { Cantus } from '@/shared/api/cantus'
import { CLEFS } from '@/shared/theory/clef'
import { MODES } from '@/shared/theory/mode'
import { formatCantusText } from './cantus-text'

/** A cantus while it is written. `auto` lets mode and final follow the notes. */
const draftSchema = z.strictObject({
  title: z.string(),
  source: z.string(),
  /** The melody as it was typed: nothing of it is lost by being wrong. */
  text: z.string(),
  mode: z.enum(['auto', ...MODES]),
  final: z.string(),
  clef: z.enum(CLEFS),
  courseId: z.string(),
  presetId: z.string(),
})
export type CantusDraft = z.infer<typeof draftSchema>

export const EMPTY_DRAFT: CantusDraft = {
  title: '',
  source: '',
  text: '',
  mode: 'auto',
  final: 'auto',
  clef: 'treble',
  courseId: '',
  presetId: 'open-undergrad',
}

export const draftOf = (cantus: Cantus): CantusDraft => ({
  ...EMPTY_DRAFT,
  title: cantus.title,
  source: cantus.source,
  text: formatCantusText(cantus.notes),
  mode: cantus.mode,
  final: cantus.final,
  clef: cantus.clef,
  courseId: cantus.courseId ?? '',
})

const keyOf = (id: string): string => `bicinium.cantus.${id}`

/** What was being written under this id (`new` for none), if this browser kept it. */
export function readDraft(id: string): CantusDraft | null {
  try {
    const stored = localStorage.getItem(keyOf(id))
    const parsed = stored ? draftSchema.safeParse(JSON.parse(stored)) : null
    return parsed?.success ? parsed.data : null
  } catch {
    return null
  }
}

export function writeDraft(id: string, draft: CantusDraft | null): void {
  try {
    if (draft) localStorage.setItem(keyOf(id), JSON.stringify(draft))
    else localStorage.removeItem(keyOf(id))
  } catch {
    // Storage that refuses costs only the draft's surviving a reload.
  }
}

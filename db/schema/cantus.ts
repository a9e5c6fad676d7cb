import type { ColumnType } from 'kysely'
import type { Cantus } from '@/shared/api/cantus'
import type { Clef } from '@/shared/theory/clef'
import type { Mode } from '@/shared/theory/mode'
import type { PitchName } from '@/shared/theory/pitch'

export interface CantusTable {
  id: string
  title: string
  /** One whole note a bar, as pitch names. */
  notes: ColumnType<PitchName[], string, string>
  mode: Mode
  final: string
  clef: Clef
  source: string
  origin: Cantus['origin']
  /** Null for the library that everyone has. */
  ownerId: string | null
  /** Course it is shared with. */
  courseId: string | null
  createdAt: ColumnType<Date, Date | undefined, never>
}

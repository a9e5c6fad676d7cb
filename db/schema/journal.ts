import type { ColumnType, Generated } from 'kysely'
import type { BoardEvent } from '@/shared/board'

/** An accepted change of one document, in the order in which it was accepted. Append only, until a snapshot holds it. */
export interface JournalChangeTable {
  lessonId: string
  /** `board`, `chorus` or `sheet/<member id>`. */
  document: string
  /** Counts the document's changes from 1. Two processes that held the same board would collide here, and one is told. */
  ordinal: number
  /** Member id; null for the server itself. */
  author: string | null
  at: Date
  /** The change as Yjs encodes it. */
  bytes: Buffer
}

/** What accepted changes meant, for ever: folded they give the lesson at any moment. */
export interface JournalEventTable {
  id: Generated<string>
  lessonId: string
  /** Member id; null for the server itself. */
  author: string | null
  at: Date
  event: ColumnType<BoardEvent, string, never>
}

/** A document whole, up to and with the change `ordinal`. */
export interface JournalSnapshotTable {
  lessonId: string
  document: string
  ordinal: number
  bytes: Buffer
  /** Whose each Yjs client id is: no one else may write under it. */
  clients: ColumnType<Readonly<Record<string, string>>, string, string>
  at: Date
}

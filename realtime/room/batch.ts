import type { JournalChange, JournalEntry } from '@/db/queries/journal'
import type { DocumentConnection } from '@/realtime/connection/document-connection'
import type { LiveDocument } from '@/realtime/document/live-document'
import type { BoardEvent } from '@/shared/board'

/** One change on its way to the journal. */
type BatchChange = Readonly<{
  live: LiveDocument
  bytes: Uint8Array
  ordinal: number
  author: string | null
  /** Where it came from, and so need not be sent. */
  from: DocumentConnection | null
}>

/** What one beat has brought in one lesson, collected in the order in which it is to stand in the journal. */
export class Batch {
  readonly lessonId: string
  readonly at: Date
  readonly changes: BatchChange[] = []
  readonly entries: JournalEntry[] = []
  /** Who is to be told "kept", about which documents. */
  readonly acks = new Map<string, Set<LiveDocument>>()

  constructor(lessonId: string, at: Date) {
    this.lessonId = lessonId
    this.at = at
  }

  get isEmpty(): boolean {
    return this.changes.length === 0 && this.acks.size === 0
  }

  addChange(
    live: LiveDocument,
    bytes: Uint8Array,
    author: string | null,
    from: DocumentConnection | null,
  ): void {
    this.changes.push({ live, bytes, ordinal: live.ordinal, author, from })
  }

  addEvents(author: string | null, events: readonly BoardEvent[]): void {
    for (const event of events) {
      this.entries.push({ lessonId: this.lessonId, author, at: this.at, event })
    }
  }

  addAck(memberId: string, live: LiveDocument): void {
    const documents = this.acks.get(memberId)
    if (documents) documents.add(live)
    else this.acks.set(memberId, new Set([live]))
  }

  /** As rows of the journal. */
  journalChanges(): readonly JournalChange[] {
    const { lessonId, at } = this
    return this.changes.map(({ live, bytes, ordinal, author }) => ({
      lessonId,
      document: live.name,
      ordinal,
      author,
      at,
      bytes,
    }))
  }
}

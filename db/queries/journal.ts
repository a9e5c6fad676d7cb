import { sql, type Transaction } from 'kysely'
import type { Connection } from '@/db/connect'
import type { Database } from '@/db/schema'
import type { BoardEvent, JournalEvent } from '@/shared/board'

/** One accepted change of a document. */
export type JournalChange = Readonly<{
  lessonId: string
  document: string
  ordinal: number
  author: string | null
  at: Date
  bytes: Uint8Array
}>

/** One thing that a change meant. */
export type JournalEntry = Readonly<{ lessonId: string; author: string | null; at: Date; event: BoardEvent }>

/** A document as the journal holds it: a snapshot, and what was accepted after it. */
export type StoredDocument = Readonly<{
  document: string
  /** Of the last change. */
  ordinal: number
  snapshot: Uint8Array | null
  clients: Readonly<Record<string, string>>
  changes: readonly Readonly<{ author: string | null; bytes: Uint8Array }>[]
}>

const columnsOf = <Row, Key extends keyof Row>(rows: readonly Row[], key: Key): Row[Key][] =>
  rows.map((row) => row[key])

/** Appends what a beat has brought, in one statement: all of it is kept, or nothing. */
export async function insertJournal(
  db: Connection | Transaction<Database>,
  changes: readonly JournalChange[],
  entries: readonly JournalEntry[],
): Promise<void> {
  const bytes = changes.map((change) =>
    Buffer.from(change.bytes.buffer, change.bytes.byteOffset, change.bytes.byteLength),
  )
  const events = entries.map(({ event }) => JSON.stringify(event))
  await sql`
    with change as (
      insert into "journalChange" ("lessonId", document, ordinal, author, at, bytes)
      select * from unnest(
        ${columnsOf(changes, 'lessonId')}::text[], ${columnsOf(changes, 'document')}::text[],
        ${columnsOf(changes, 'ordinal')}::int[], ${columnsOf(changes, 'author')}::text[],
        ${columnsOf(changes, 'at')}::timestamptz[], ${bytes}::bytea[])
    )
    insert into "journalEvent" ("lessonId", author, at, event)
    select "lessonId", author, at, event::jsonb from unnest(
      ${columnsOf(entries, 'lessonId')}::text[], ${columnsOf(entries, 'author')}::text[],
      ${columnsOf(entries, 'at')}::timestamptz[], ${events}::text[])
      with ordinality as entry ("lessonId", author, at, event, place)
    order by place`.execute(db)
}

/** Every document of a lesson. Snapshots and changes are read at one moment, so that none is missed between them. */
export async function listDocuments(db: Connection, lessonId: string): Promise<readonly StoredDocument[]> {
  const { snapshots, changes } = await db
    .transaction()
    .setIsolationLevel('repeatable read')
    .execute(async (trx) => ({
      snapshots: await trx
        .selectFrom('journalSnapshot')
        .select(['document', 'ordinal', 'bytes', 'clients'])
        .where('lessonId', '=', lessonId)
        .execute(),
      changes: await trx
        .selectFrom('journalChange')
        .select(['document', 'ordinal', 'author', 'bytes'])
        .where('lessonId', '=', lessonId)
        .orderBy('document')
        .orderBy('ordinal')
        .execute(),
    }))
  const documents = new Map<string, StoredDocument>()
  for (const { document, ordinal, bytes, clients } of snapshots) {
    documents.set(document, { document, ordinal, snapshot: bytes, clients, changes: [] })
  }
  for (const { document, ordinal, author, bytes } of changes) {
    const before = documents.get(document) ?? {
      document,
      ordinal: 0,
      snapshot: null,
      clients: {},
      changes: [],
    }
    if (ordinal <= before.ordinal) continue
    const list = before.changes as { author: string | null; bytes: Uint8Array }[]
    list.push({ author, bytes })
    documents.set(document, { ...before, ordinal })
  }
  return [...documents.values()]
}

/** Keeps a document whole and lets go of the changes that it holds. Their events stay. */
export async function upsertSnapshot(
  db: Connection,
  snapshot: Readonly<{
    lessonId: string
    document: string
    ordinal: number
    bytes: Uint8Array
    clients: Readonly<Record<string, string>>
    at: Date
  }>,
): Promise<void> {
  const { lessonId, document, ordinal, at } = snapshot
  const bytes = Buffer.from(snapshot.bytes)
  const clients = JSON.stringify(snapshot.clients)
  await db.transaction().execute(async (trx) => {
    await trx
      .insertInto('journalSnapshot')
      .values({ lessonId, document, ordinal, bytes, clients, at })
      .onConflict((conflict) =>
        conflict
          .columns(['lessonId', 'document'])
          .doUpdateSet({ ordinal, bytes, clients, at })
          .where('journalSnapshot.ordinal', '<', ordinal),
      )
      .execute()
    await trx
      .deleteFrom('journalChange')
      .where('lessonId', '=', lessonId)
      .where('document', '=', document)
      .where('ordinal', '<=', ordinal)
      .execute()
  })
}

/** A lesson's events in their order, `limit` at a time. */
export async function listEvents(
  db: Connection,
  lessonId: string,
  { after = '0', limit = 10_000 }: { after?: string; limit?: number } = {},
): Promise<readonly (JournalEvent & Readonly<{ id: string }>)[]> {
  const rows = await db
    .selectFrom('journalEvent')
    .select(['id', 'author', 'at', 'event'])
    .where('lessonId', '=', lessonId)
    .where('id', '>', after)
    .orderBy('id')
    .limit(limit)
    .execute()
  return rows.map(({ id, author, at, event }) => ({ id, by: author, at, event }))
}

const PROBE_BYTES = 16 * 1024

class ProbeDone extends Error {}

/** Whether the journal can be written: writes into it and takes that back. Throws what the database says otherwise. */
export async function probeJournal(db: Connection, lessonId: string): Promise<void> {
  try {
    await db.transaction().execute(async (trx) => {
      const bytes = Buffer.alloc(PROBE_BYTES)
      await trx
        .insertInto('journalChange')
        .values({ lessonId, document: 'probe', ordinal: 0, author: null, at: new Date(0), bytes })
        .execute()
      throw new ProbeDone()
    })
  } catch (error) {
    if (!(error instanceof ProbeDone)) throw error
  }
}

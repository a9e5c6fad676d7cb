import * as Y from 'yjs'
import type { StoredDocument } from '@/db/queries/journal'
import type { DocumentKind } from '@/shared/wire/documents'
import type { ClientOwners } from './admit-update'
import { LOG_BYTES, SERVER_CLIENT_ID } from './limits'
import type { ParsedUpdate } from './parse-update'

/** What one transaction did: its bytes, and the keys it wrote, by root map. */
export type DocumentChange = Readonly<{
  bytes: Uint8Array
  keys: ReadonlyMap<string, ReadonlySet<string>>
}>

const SERVER = ''

/**
 * A document in memory. `doc` runs ahead of the journal only while a beat is being written; until then the change can be
 * taken back, for all that was ever kept is here as bytes too.
 */
export class LiveDocument {
  readonly kind: DocumentKind
  /** Name in the journal: `board`, `chorus`, `sheet/<member>`. */
  readonly name: string
  /** Of a sheet. */
  readonly memberId: string | null
  #doc: Y.Doc
  #owners = new Map<number, string | null>()
  #keptOwners = new Map<number, string | null>()
  /** Everything kept: a whole state, and the changes after it. */
  #whole: Uint8Array | null = null
  #changes: Uint8Array[] = []
  #changeBytes = 0
  #keptOrdinal = 0
  #ordinal = 0
  #snapshotOrdinal = 0

  constructor(kind: DocumentKind, memberId: string | null, stored: StoredDocument | null) {
    this.kind = kind
    this.memberId = memberId
    this.name = memberId === null ? kind : `${kind}/${memberId}`
    this.#doc = new Y.Doc()
    this.restore(stored)
  }

  get doc(): Y.Doc {
    return this.#doc
  }

  get owners(): ClientOwners {
    return this.#owners
  }

  /** Number of the last change, kept or about to be. */
  get ordinal(): number {
    return this.#ordinal
  }

  get changesSinceSnapshot(): number {
    return this.#keptOrdinal - this.#snapshotOrdinal
  }

  /** At most the size of the document; exact after `fold`. */
  get bytes(): number {
    return (this.#whole?.byteLength ?? 0) + this.#changeBytes
  }

  /** Takes the journal's word for what the document is. */
  restore(stored: StoredDocument | null): void {
    this.#whole = stored?.snapshot ?? null
    this.#changes = stored?.changes.map(({ bytes }) => bytes) ?? []
    this.#changeBytes = this.#changes.reduce((sum, { byteLength }) => sum + byteLength, 0)
    this.#keptOrdinal = stored?.ordinal ?? 0
    this.#snapshotOrdinal = this.#keptOrdinal - (stored?.changes.length ?? 0)
    this.#keptOwners = new Map(
      Object.entries(stored?.clients ?? {}).map(([client, member]) => [
        Number(client),
        member === SERVER ? null : member,
      ]),
    )
    for (const { author, bytes } of stored?.changes ?? []) {
      for (const client of Y.parseUpdateMeta(bytes).to.keys()) {
        if (!this.#keptOwners.has(client)) this.#keptOwners.set(client, author)
      }
    }
    this.#rebuild()
    this.fold()
  }

  /** Forgets what the journal did not take. */
  rollBack(): void {
    if (this.#ordinal !== this.#keptOrdinal) this.#rebuild()
  }

  #rebuild(): void {
    const doc = new Y.Doc()
    doc.transact(() => {
      if (this.#whole) Y.applyUpdate(doc, this.#whole)
      for (const bytes of this.#changes) Y.applyUpdate(doc, bytes)
    })
    // Only now: Yjs leaves an id under which it sees others write.
    doc.clientID = SERVER_CLIENT_ID
    this.#doc.destroy()
    this.#doc = doc
    this.#ordinal = this.#keptOrdinal
    this.#owners = new Map(this.#keptOwners).set(SERVER_CLIENT_ID, null)
  }

  /** Applies an update that was admitted; null when there was nothing new in it. */
  apply({ bytes }: ParsedUpdate, author: string, fresh: readonly number[]): DocumentChange | null {
    const change = this.#transact(() => Y.applyUpdate(this.#doc, bytes))
    for (const client of fresh) this.#owners.set(client, author)
    return change
  }

  /** Writes as the server; null when nothing was written. */
  write(work: (doc: Y.Doc) => void): DocumentChange | null {
    return this.#transact(() => work(this.#doc))
  }

  #transact(work: () => void): DocumentChange | null {
    const doc = this.#doc
    let bytes: Uint8Array | null = null
    const keys = new Map<string, Set<string>>()
    const onUpdate = (update: Uint8Array) => (bytes = update)
    const onTransaction = ({ changed }: Y.Transaction) => {
      for (const [name, type] of doc.share) {
        const names = changed.get(type as never)
        if (names) keys.set(name, new Set([...names].filter((key) => key !== null)))
      }
    }
    doc.on('update', onUpdate)
    doc.on('afterTransaction', onTransaction)
    try {
      doc.transact(work)
    } finally {
      doc.off('update', onUpdate)
      doc.off('afterTransaction', onTransaction)
    }
    if (bytes === null) return null
    this.#ordinal += 1
    return { bytes, keys }
  }

  /** The journal has taken a change. */
  keep(bytes: Uint8Array): void {
    this.#keptOrdinal += 1
    this.#changes.push(bytes)
    this.#changeBytes += bytes.byteLength
    if (this.#keptOwners.size !== this.#owners.size) this.#keptOwners = new Map(this.#owners)
    const isClean = this.#ordinal === this.#keptOrdinal
    if (isClean && this.#changeBytes > Math.max(LOG_BYTES, this.#whole?.byteLength ?? 0)) this.fold()
  }

  /** Makes one whole state of what is kept. Only while nothing is on its way to the journal. */
  fold(): void {
    if (this.#changes.length === 0 || this.#ordinal !== this.#keptOrdinal) return
    this.#whole = Y.encodeStateAsUpdate(this.#doc)
    this.#changes = []
    this.#changeBytes = 0
  }

  /** The document whole, for the journal. Only while nothing is on its way there. */
  snapshot(): Readonly<{ ordinal: number; bytes: Uint8Array; clients: Readonly<Record<string, string>> }> {
    this.fold()
    return {
      ordinal: this.#keptOrdinal,
      bytes: this.#whole ?? Y.encodeStateAsUpdate(this.#doc),
      clients: Object.fromEntries(
        [...this.#owners].map(([client, member]) => [String(client), member ?? SERVER]),
      ),
    }
  }

  snapshotTaken(ordinal: number): void {
    this.#snapshotOrdinal = Math.max(this.#snapshotOrdinal, ordinal)
  }

  /** How far a member has come under each Yjs id of theirs. */
  clocksOf(memberId: string): Readonly<Record<string, number>> {
    const clocks: Record<string, number> = {}
    for (const [client, owner] of this.#owners) {
      if (owner === memberId) clocks[client] = Y.getState(this.#doc.store, client)
    }
    return clocks
  }

  destroy(): void {
    this.#doc.destroy()
  }
}

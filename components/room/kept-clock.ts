import * as Y from 'yjs'

/**
 * Whether all that stands in a document is in the journal. What the server sends is; what is written here is when the
 * server has said so for its clock.
 */
export class KeptClock {
  readonly #doc: Y.Doc
  readonly #kept = new Map<number, number>()

  constructor(doc: Y.Doc) {
    this.#doc = doc
  }

  acknowledge(clocks: Readonly<Record<string, number>>): void {
    for (const [client, clock] of Object.entries(clocks)) this.#raise(Number(client), clock)
  }

  /** An update that came from the server. */
  received(update: Uint8Array): void {
    for (const [client, clock] of Y.parseUpdateMeta(update).to) this.#raise(client, clock)
  }

  #raise(client: number, clock: number): void {
    if (clock > (this.#kept.get(client) ?? 0)) this.#kept.set(client, clock)
  }

  get isAllKept(): boolean {
    for (const client of this.#doc.store.clients.keys()) {
      if (Y.getState(this.#doc.store, client) > (this.#kept.get(client) ?? 0)) return false
    }
    return true
  }
}

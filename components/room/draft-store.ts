import * as Y from 'yjs'

/** The part of the browser's storage that is needed. */
export type Storage = Pick<globalThis.Storage, 'getItem' | 'setItem' | 'removeItem'>

const KEY_PREFIX = 'bicinium/sheet/'

const toText = (bytes: Uint8Array): string => {
  let binary = ''
  for (const byte of bytes) binary += String.fromCharCode(byte)
  return btoa(binary)
}

const toBytes = (text: string): Uint8Array => Uint8Array.from(atob(text), (char) => char.charCodeAt(0))

/**
 * Holds a sheet in the browser while any of it is not acknowledged, so that no note is lost with a tab that is closed
 * offline. `localStorage`, because it has written before the tab can be gone. Two tabs of one member share it: each
 * merges what it finds. When all is kept by the server nothing stays on the phone.
 */
export class DraftStore {
  readonly key: string
  readonly #storage: Storage | null

  constructor(storage: Storage | null, lessonId: string, memberId: string) {
    this.#storage = storage
    this.key = `${KEY_PREFIX}${lessonId}/${memberId}`
  }

  /** What an earlier page or another tab left, or null. What cannot be read is no draft. */
  read(): Uint8Array | null {
    try {
      const text = this.#storage?.getItem(this.key)
      if (!text) return null
      const bytes = toBytes(text)
      Y.decodeUpdate(bytes)
      return bytes
    } catch {
      return null
    }
  }

  /** Holds the sheet. False when the browser would not (full, or forbidden): then only the open tab has it. */
  hold(doc: Y.Doc): boolean {
    if (!this.#storage) return false
    try {
      const own = Y.encodeStateAsUpdate(doc)
      const found = this.read()
      this.#storage.setItem(this.key, toText(found ? Y.mergeUpdates([found, own]) : own))
      return true
    } catch {
      return false
    }
  }

  /** Lets go of it, unless another tab holds something that this one has not. */
  release(doc: Y.Doc): void {
    const found = this.read()
    if (found) {
      for (const [client, clock] of Y.parseUpdateMeta(found).to) {
        if (clock > Y.getState(doc.store, client)) return
      }
    }
    try {
      this.#storage?.removeItem(this.key)
    } catch {
      // A browser that forbids storage holds nothing either.
    }
  }
}

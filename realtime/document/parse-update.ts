import * as Y from 'yjs'
import { fail, ok, type Result } from '@/shared/result'
import { parseProposalKey } from '@/shared/board'
import { parseBar } from '@/shared/board/parse-value'
import { DOCUMENT_MAPS, MAX_BARS, type DocumentKind } from '@/shared/wire/documents'
import { MAX_CLOCK, VALUE_DEPTH } from './limits'

/** An update that holds nothing but plain values under the keys of its document's root maps. */
export type ParsedUpdate = Readonly<{
  bytes: Uint8Array
  structs: readonly ParsedStruct[]
  deletes: readonly Readonly<{ client: number; end: number }>[]
}>

export type ParsedStruct = Readonly<{
  client: number
  clock: number
  length: number
  /** The entry it overwrites. */
  origin: Readonly<{ client: number; clock: number }> | null
}>

export type UpdateProblem =
  'not-an-update' | 'nested-type' | 'not-an-entry' | 'unknown-root' | 'unknown-key' | 'not-plain' | 'clock'

const MARK_KEY = /^(apex|gesture-edge|weak):([1-9][0-9]?)$/
const ID_KEY = /^[A-Za-z0-9_-]{1,64}$/

const isBarKey = (key: string): boolean => parseBar(key) !== null
const isValueKey = (key: string): boolean => key === 'value'

/** Which keys each root map may have. With it a document cannot be filled with keys that nobody reads. */
const KEYS: Readonly<Record<string, (key: string) => boolean>> = {
  exercise: isValueKey,
  stage: isValueKey,
  bars: isBarKey,
  line: isBarKey,
  spread: isBarKey,
  notes: isBarKey,
  proposals: (key) => parseProposalKey(key) !== null,
  gestures: (key) => ID_KEY.test(key),
  marks: (key) => {
    const match = MARK_KEY.exec(key)
    return match !== null && Number(match[2]) <= MAX_BARS
  },
}

/** Whether a value is what JSON can say, and not nested to absurdity. */
function isPlain(value: unknown, depth = VALUE_DEPTH): boolean {
  if (value === null || typeof value === 'boolean') return true
  // The journal keeps events as JSON in a database that knows no null character.
  if (typeof value === 'string') return !value.includes('\u0000')
  if (typeof value === 'number') return Number.isFinite(value)
  if (typeof value !== 'object' || depth === 0) return false
  if (Array.isArray(value)) return value.every((item) => isPlain(item, depth - 1))
  if (Object.getPrototypeOf(value) !== Object.prototype) return false
  return Object.entries(value).every(([key, item]) => !key.includes('\u0000') && isPlain(item, depth - 1))
}

function parseItem(kind: DocumentKind, item: Y.Item): Result<ParsedStruct, UpdateProblem> {
  const { client, clock } = item.id
  const { content, parent, parentSub, origin, rightOrigin } = item
  if (content instanceof Y.ContentAny) {
    // A map's entry is one value; more of them would be a list.
    if (content.arr.length !== 1) return fail('not-an-entry')
    if (!isPlain(content.arr[0])) return fail('not-plain')
  } else if (!(content instanceof Y.ContentDeleted)) return fail('nested-type')
  if (rightOrigin !== null) return fail('not-an-entry')
  if (origin === null) {
    // The first value under a key names its root map; later ones name the value they overwrite.
    if (typeof parent !== 'string') return fail('nested-type')
    if (!Object.hasOwn(DOCUMENT_MAPS[kind], parent)) return fail('unknown-root')
    if (parentSub === null) return fail('not-an-entry')
    if (!KEYS[parent]?.(parentSub)) return fail('unknown-key')
  }
  return ok({
    client,
    clock,
    length: item.length,
    origin: origin && { client: origin.client, clock: origin.clock },
  })
}

/**
 * Reads an update without applying it. `Y.decodeUpdate` takes what it finds lazily: an update that announces millions of
 * parts in nine bytes costs nothing here, and a quarter of a gigabyte when it is simply applied.
 */
export function parseUpdate(kind: DocumentKind, bytes: Uint8Array): Result<ParsedUpdate, UpdateProblem> {
  let decoded: ReturnType<typeof Y.decodeUpdate>
  try {
    decoded = Y.decodeUpdate(bytes)
  } catch {
    return fail('not-an-update')
  }
  const structs: ParsedStruct[] = []
  for (const struct of decoded.structs) {
    const end = struct.id.clock + struct.length
    if (!Number.isSafeInteger(end) || end > MAX_CLOCK || struct.length < 1) return fail('clock')
    if (!(struct instanceof Y.Item)) return fail('not-an-entry')
    const parsed = parseItem(kind, struct)
    if (!parsed.ok) return parsed
    structs.push(parsed.value)
  }
  const deletes: { client: number; end: number }[] = []
  for (const [client, ranges] of decoded.ds.clients) {
    for (const { clock, len } of ranges) {
      const end = clock + len
      if (!Number.isSafeInteger(end) || end > MAX_CLOCK) return fail('clock')
      deletes.push({ client, end })
    }
  }
  return ok({ bytes, structs, deletes })
}

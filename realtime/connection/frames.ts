import * as decoding from 'lib0/decoding'
import * as encoding from 'lib0/encoding'
import { messageYjsSyncStep1, messageYjsSyncStep2, messageYjsUpdate } from 'y-protocols/sync'
import * as Y from 'yjs'
import { fail, ok, type Result } from '@/shared/result'

/** Kinds of message in y-websocket's protocol. */
const SYNC = 0
const AWARENESS = 1
const QUERY_AWARENESS = 3

/** What a phone sent. Presence goes by the class channel, so awareness is heard and not passed on. */
export type Frame =
  Readonly<{ kind: 'step1' | 'step2' | 'update'; bytes: Uint8Array }> | Readonly<{ kind: 'awareness' }>

export function parseFrame(data: Uint8Array): Result<Frame, 'not-a-frame'> {
  try {
    const decoder = decoding.createDecoder(data)
    switch (decoding.readVarUint(decoder)) {
      case SYNC:
        return parseSync(decoder)
      case AWARENESS:
      case QUERY_AWARENESS:
        return ok({ kind: 'awareness' })
      default:
        return fail('not-a-frame')
    }
  } catch {
    return fail('not-a-frame')
  }
}

function parseSync(decoder: decoding.Decoder): Result<Frame, 'not-a-frame'> {
  const step = decoding.readVarUint(decoder)
  const bytes = decoding.readVarUint8Array(decoder)
  if (decoding.hasContent(decoder)) return fail('not-a-frame')
  switch (step) {
    case messageYjsSyncStep1:
      // Throws on anything that is no state vector.
      Y.decodeStateVector(bytes)
      return ok({ kind: 'step1', bytes })
    case messageYjsSyncStep2:
      return ok({ kind: 'step2', bytes })
    case messageYjsUpdate:
      return ok({ kind: 'update', bytes })
    default:
      return fail('not-a-frame')
  }
}

function formatSync(step: number, bytes: Uint8Array): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, SYNC)
  encoding.writeVarUint(encoder, step)
  encoding.writeVarUint8Array(encoder, bytes)
  return encoding.toUint8Array(encoder)
}

/** Asks for all that the other side has and `doc` has not. */
export const formatStep1 = (doc: Y.Doc): Uint8Array =>
  formatSync(messageYjsSyncStep1, Y.encodeStateVector(doc))

/** Answers a step 1: all that `doc` has and the other side has not. */
export const formatStep2 = (doc: Y.Doc, stateVector: Uint8Array): Uint8Array =>
  formatSync(messageYjsSyncStep2, Y.encodeStateAsUpdate(doc, stateVector))

export const formatUpdate = (bytes: Uint8Array): Uint8Array => formatSync(messageYjsUpdate, bytes)

/** An awareness message about nobody: y-websocket gives up a connection on which it hears nothing for half a minute. */
export const KEEP_ALIVE: Uint8Array = (() => {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, AWARENESS)
  encoding.writeVarUint8Array(encoder, new Uint8Array([0]))
  return encoding.toUint8Array(encoder)
})()

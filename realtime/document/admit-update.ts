import * as Y from 'yjs'
import { fail, ok, type Result } from '@/shared/result'
import { CLIENTS_A_DOCUMENT } from './limits'
import type { ParsedUpdate } from './parse-update'

export type AdmissionProblem = 'missing-predecessor' | 'foreign-client' | 'too-many-clients'

/** Whose a Yjs client id is in one document: a member's, or the server's (`null`). */
export type ClientOwners = ReadonlyMap<number, string | null>

/**
 * Whether an update may join a document now: everything it builds on is there, and everything new in it is written under
 * ids that are its author's. Gives the ids that are new, which from then on belong to the author. What is missing is not
 * waited for: a queue of updates that never complete would be memory for the asking.
 */
export function admitUpdate(
  doc: Y.Doc,
  owners: ClientOwners,
  author: string,
  update: ParsedUpdate,
): Result<readonly number[], AdmissionProblem> {
  const known = new Map<number, number>()
  const clockOf = (client: number): number => known.get(client) ?? Y.getState(doc.store, client)
  const fresh: number[] = []
  for (const { client, clock, length, origin } of update.structs) {
    const at = clockOf(client)
    if (clock > at) return fail('missing-predecessor')
    if (clock + length <= at) continue
    const owner = owners.get(client)
    if (owner === undefined) {
      if (!fresh.includes(client)) fresh.push(client)
    } else if (owner !== author) return fail('foreign-client')
    if (origin && origin.clock >= clockOf(origin.client)) return fail('missing-predecessor')
    known.set(client, clock + length)
  }
  if (owners.size + fresh.length > CLIENTS_A_DOCUMENT) return fail('too-many-clients')
  if (update.deletes.some(({ client, end }) => end > clockOf(client))) return fail('missing-predecessor')
  return ok(fresh)
}

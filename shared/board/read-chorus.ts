import type * as Y from 'yjs'
import { chorusProposalSchema, type ChorusProposal } from '@/shared/wire/documents'
import type { ChorusState } from './board-state'
import { parseBar, parseValue, readEntries } from './parse-value'

const MEMBER_GRAMMAR = /^[A-Za-z0-9_-]{1,64}$/

export const formatProposalKey = (bar: number, memberId: string): string => `${bar}:${memberId}`

/** Reads `bar:member`; null for anything else. */
export function parseProposalKey(key: string): Readonly<{ bar: number; memberId: string }> | null {
  const colon = key.indexOf(':')
  if (colon < 0) return null
  const bar = parseBar(key.slice(0, colon))
  const memberId = key.slice(colon + 1)
  return bar !== null && MEMBER_GRAMMAR.test(memberId) ? { bar, memberId } : null
}

/** Every standing proposal. Never throws. */
export function readChorus(doc: Y.Doc): ChorusState {
  const chorus: Record<number, Record<string, ChorusProposal>> = {}
  for (const [key, proposal] of readEntries(doc, 'proposals', chorusProposalSchema)) {
    const place = parseProposalKey(key)
    if (place) (chorus[place.bar] ??= {})[place.memberId] = proposal
  }
  return chorus
}

/** The chorus after some keys were written: bars without a change keep their identity, so that little is drawn again. */
export function updateChorus(before: ChorusState, doc: Y.Doc, keys: Iterable<string>): ChorusState {
  const proposals = doc.getMap<unknown>('proposals')
  const fresh: Record<number, Record<string, ChorusProposal>> = {}
  for (const key of keys) {
    const place = parseProposalKey(key)
    if (!place) continue
    const bar = (fresh[place.bar] ??= { ...before[place.bar] })
    const proposal = parseValue(chorusProposalSchema, proposals.get(key))
    if (proposal) bar[place.memberId] = proposal
    else delete bar[place.memberId]
  }
  const after: Record<number, ChorusState[number]> = { ...before, ...fresh }
  for (const bar of Object.keys(fresh).map(Number)) {
    if (Object.keys(after[bar] as object).length === 0) delete after[bar]
  }
  return after
}

import type { z } from 'zod'
import type { LessonIdentity } from '@/realtime/contract'
import { can } from '@/shared/board'
import { CHANNEL_REQUESTS, type ChannelRequest } from '@/shared/wire/rooms'
import type { Presence } from './presence'

type Cue = z.infer<(typeof CHANNEL_REQUESTS)['cue']>

/** What is to follow from a request on the class channel. */
export type RequestOutcome =
  | Readonly<{ kind: 'refused'; error: 'bad-request' | 'forbidden' | 'not-found' }>
  /** A hand went up or down: its owner is told, and everybody how many are up. */
  | Readonly<{ kind: 'hand'; memberId: string; isUp: boolean }>
  | Readonly<{ kind: 'cue'; cue: Cue }>
  | Readonly<{ kind: 'remove'; memberId: string }>
  | Readonly<{ kind: 'done' }>

const refused = (error: 'bad-request' | 'forbidden' | 'not-found'): RequestOutcome => ({
  kind: 'refused',
  error,
})

/** The payload parsed, or null. A value nested too deep for the parser is no payload either. */
function parsePayload<Name extends ChannelRequest>(
  name: Name,
  payload: unknown,
): z.infer<(typeof CHANNEL_REQUESTS)[Name]> | null {
  try {
    const parsed = CHANNEL_REQUESTS[name].safeParse(payload)
    return parsed.success ? (parsed.data as z.infer<(typeof CHANNEL_REQUESTS)[Name]>) : null
  } catch {
    return null
  }
}

const turnHand = (presence: Presence, memberId: string, isUp: boolean): RequestOutcome =>
  presence.setHand(memberId, isUp) ? { kind: 'hand', memberId, isUp } : { kind: 'done' }

/** Judges a request by the table of who may do what, and does to the presence what it asks. */
export function answerRequest(
  { role, memberId }: LessonIdentity,
  presence: Presence,
  name: ChannelRequest,
  payload: unknown,
): RequestOutcome {
  switch (name) {
    case 'hand': {
      if (!can(role, 'raise hand') || memberId === null) return refused('forbidden')
      const hand = parsePayload('hand', payload)
      if (!hand) return refused('bad-request')
      return turnHand(presence, memberId, hand.up)
    }
    case 'lowerHand': {
      if (!can(role, 'lower any hand')) return refused('forbidden')
      const target = parsePayload('lowerHand', payload)
      if (!target) return refused('bad-request')
      if (!presence.has(target.memberId)) return refused('not-found')
      return turnHand(presence, target.memberId, false)
    }
    case 'cue': {
      if (!can(role, 'cue wall')) return refused('forbidden')
      const cue = parsePayload('cue', payload)
      return cue ? { kind: 'cue', cue } : refused('bad-request')
    }
    case 'remove': {
      if (!can(role, 'remove member')) return refused('forbidden')
      const target = parsePayload('remove', payload)
      return target ? { kind: 'remove', memberId: target.memberId } : refused('bad-request')
    }
  }
}

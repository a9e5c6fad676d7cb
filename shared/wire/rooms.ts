/**
 * Where the documents travel and what the class channel says. y-websocket takes `wsUrl` and a room name:
 * `new WebsocketProvider(origin + DOCUMENT_PATH, roomOf.sheet(lessonId, memberId), doc)`.
 */
import { z } from 'zod'
import { barNotesSchema, MAX_BARS } from './documents'

export const DOCUMENT_PATH = '/live'
export const CHANNEL_PATH = '/socket.io'

export const roomOf = {
  board: (lessonId: string) => `${lessonId}/board`,
  sheet: (lessonId: string, memberId: string) => `${lessonId}/sheet/${memberId}`,
  chorus: (lessonId: string) => `${lessonId}/chorus`,
} as const

export const WIRE_LIMITS = {
  /** One Yjs update or step-2 reply from a phone. */
  updateBytes: 16 * 1024,
  /** The first sync of a connection carries a whole delete set. */
  firstSyncBytes: 256 * 1024,
  /** A `ws` frame; above both caps, so that an oversize message is answered with a reason. */
  frameBytes: 512 * 1024,
  sheetBytes: 128 * 1024,
  boardBytes: 1024 * 1024,
  messagesASecond: 40,
  membersALesson: 600,
  connectionsAMember: 8,
  beatMs: 25,
  /** One message of the class channel; the longest is a cue with a proposal. */
  channelBytes: 32 * 1024,
  channelMessagesASecond: 10,
} as const

/** Close codes 4400 to 4499 tell y-websocket not to come back. Outside that range it reconnects by itself. */
export const CLOSE = {
  badRequest: { code: 4400, reason: 'bad-request' },
  signedOut: { code: 4401, reason: 'signed-out' },
  forbidden: { code: 4403, reason: 'forbidden' },
  notFound: { code: 4404, reason: 'not-found' },
  ended: { code: 4410, reason: 'lesson-ended' },
  removed: { code: 4411, reason: 'removed' },
  tooLarge: { code: 4413, reason: 'too-large' },
  malformed: { code: 4422, reason: 'malformed' },
  tooFast: { code: 4429, reason: 'too-fast' },
  full: { code: 4430, reason: 'lesson-full' },
  /** Comes back: the database could not keep what was sent; what was not acknowledged is sent again. */
  notKept: { code: 4503, reason: 'not-kept' },
  restarting: { code: 4504, reason: 'restarting' },
} as const

/** Who is in the room, as the lectern sees it. Students and the wall are told counts only, unless names are shown. */
export const presentMemberSchema = z.strictObject({
  memberId: z.string(),
  name: z.string(),
  role: z.enum(['teacher', 'assistant', 'student', 'guest']),
  isOnline: z.boolean(),
  hand: z.boolean(),
})
export type PresentMember = z.infer<typeof presentMemberSchema>

/** What a client may say on the class channel: event name to payload. Every payload is parsed strictly. */
export const CHANNEL_REQUESTS = {
  /** Raise or lower one's hand. */
  hand: z.strictObject({ up: z.boolean() }),
  /** Lectern: lower somebody's hand. */
  lowerHand: z.strictObject({ memberId: z.string().max(64) }),
  /** Lectern: tell the wall (and only the wall) to play or stop. */
  cue: z.discriminatedUnion('kind', [
    z.strictObject({
      kind: z.literal('play'),
      voices: z.enum(['cantus', 'line', 'both']),
      fromBar: z.int().min(1).max(MAX_BARS),
      toBar: z.int().min(1).max(MAX_BARS),
      tempo: z.number().min(20).max(240),
      /** A proposal laid over the line for this hearing: bar number to notes. */
      proposal: z.record(z.string().regex(/^[1-9][0-9]?$/), barNotesSchema).optional(),
    }),
    z.strictObject({ kind: z.literal('stop') }),
  ]),
  /** Lectern: end one member's presence for good. */
  remove: z.strictObject({ memberId: z.string().max(64) }),
} as const
export type ChannelRequest = keyof typeof CHANNEL_REQUESTS

/** What the server says on the class channel. */
export type ChannelEvents = Readonly<{
  /** `members` only to teacher and assistants (and to the wall while names are shown). */
  presence: (state: Readonly<{ here: number; hands: number; members?: readonly PresentMember[] }>) => void
  /** To one member alone, on each of their screens: whether their own hand is up. Told on arrival and at every change. */
  ownHand: (state: Readonly<{ up: boolean }>) => void
  /**
   * Everything up to `clock` of Yjs client `client` in `room` is in the journal. A client shows "kept" when all that it
   * wrote is covered.
   */
  kept: (ack: Readonly<{ room: string; clocks: Readonly<Record<string, number>> }>) => void
  cue: (cue: z.infer<(typeof CHANNEL_REQUESTS)['cue']>) => void
  /**
   * Whether what is written is being kept. While it is not, phones hold their own notes and send them by themselves when
   * it is again; reading goes on.
   */
  keeping: (state: Readonly<{ ok: true } | { ok: false; because: 'database' | 'disk-full' }>) => void
  /** The lesson changed outside its documents: door, ended, role. Ask the API again. */
  lesson: (change: Readonly<{ kind: 'door' | 'ended' | 'role' | 'removed' | 'roster' }>) => void
}>

/** What a client gives with its connection to the class channel. */
export const channelAuthSchema = z.strictObject({ lessonId: z.string().regex(/^[A-Za-z0-9_-]{8,64}$/) })

/** Answer to every channel request. */
export type ChannelReply = Readonly<{ ok: true } | { ok: false; error: string }>

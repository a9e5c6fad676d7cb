import type { IdentityRefusal } from '@/realtime/contract'
import { CLOSE } from '@/shared/wire/rooms'
import type { Closing } from './document-connection'

/** How a connection is closed for each way of not being let in. */
export const CLOSING_OF: Readonly<Record<IdentityRefusal, Closing>> = {
  'signed-out': CLOSE.signedOut,
  forbidden: CLOSE.forbidden,
  'not-found': CLOSE.notFound,
  'lesson-ended': CLOSE.ended,
  removed: CLOSE.removed,
  'lesson-full': CLOSE.full,
}

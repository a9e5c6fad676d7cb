import type { Asker } from '@/server/auth/asker'
import { found, Refused } from '@/server/errors/refused'
import type { Context } from '@/server/routes/context'
import { can, type Act } from '@/shared/board'
import type { ApiErrorCode } from '@/shared/api/errors'
import type { EntryRefusal } from './enter-lesson'
import { findStanding, type Standing } from './find-standing'

/** What the asker is in a lesson. To those with no part in it, it does not exist. */
export async function standingFor(context: Context, asker: Asker, lessonId: string): Promise<Standing> {
  if (!asker.person && !asker.wall) throw new Refused('signed-out')
  return found(await findStanding(context.db, lessonId, asker))
}

/** The same, for somebody who wants to do `act`. */
export async function standingToAct(
  context: Context,
  asker: Asker,
  lessonId: string,
  act: Act,
): Promise<Standing> {
  const standing = await standingFor(context, asker, lessonId)
  const { role } = standing
  // An administrator clears away what no teacher is left to clear, and does nothing else in a lesson.
  const may = role === 'administrator' ? act === 'remove lesson' : can(role, act)
  if (!may) throw new Refused('forbidden')
  return standing
}

export const ENTRY_ERRORS: Readonly<Record<EntryRefusal, ApiErrorCode>> = {
  'signed-out': 'signed-out',
  forbidden: 'forbidden',
  'not-found': 'not-found',
  'lesson-ended': 'ended',
  removed: 'forbidden',
  'lesson-full': 'lesson-full',
  'door-closed': 'door-closed',
}

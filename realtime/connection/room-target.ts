import type { LessonIdentity } from '@/realtime/contract'
import { can } from '@/shared/board'
import { DOCUMENT_PATH } from '@/shared/wire/rooms'

/** The document that an address names. */
export type RoomTarget = Readonly<{
  lessonId: string
  kind: 'board' | 'sheet' | 'chorus'
  /** Whose sheet. */
  memberId: string | null
}>

const ID = '[A-Za-z0-9_-]{8,64}'
const TARGET_GRAMMAR = new RegExp(`^${DOCUMENT_PATH}/(${ID})/(?:(board|chorus)|sheet/(${ID}))$`)

/** Reads the address of an upgrade request; null for any other. */
export function parseRoomTarget(url: string): RoomTarget | null {
  const [path = ''] = url.split('?')
  const match = TARGET_GRAMMAR.exec(path)
  if (!match) return null
  const [, lessonId, kind, memberId] = match
  return {
    lessonId: lessonId as string,
    kind: memberId ? 'sheet' : (kind as 'board' | 'chorus'),
    memberId: memberId ?? null,
  }
}

/** What a person (or wall) may do with a document, by the table of who may do what. */
export function accessTo(target: RoomTarget, identity: LessonIdentity): 'write' | 'read' | null {
  const { role, memberId } = identity
  switch (target.kind) {
    case 'board':
      if (memberId !== null && can(role, 'write board')) return 'write'
      return can(role, 'see board') ? 'read' : null
    case 'chorus':
      return can(role, 'see chorus') ? 'read' : null
    case 'sheet':
      if (target.memberId === memberId && can(role, 'see own sheet')) {
        return can(role, 'propose') ? 'write' : 'read'
      }
      return can(role, 'see every sheet') ? 'read' : null
  }
}

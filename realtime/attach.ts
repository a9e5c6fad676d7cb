import { listLessonMembers, updateLessonMember } from '@/db/queries/lesson-members'
import { findLesson } from '@/db/queries/lessons'
import { can } from '@/shared/board'
import { CLOSE } from '@/shared/wire/rooms'
import { ClassChannel } from './channel/class-channel'
import { DocumentServer } from './connection/document-server'
import type { Realtime, RealtimeOptions } from './contract'
import { Rooms } from './room/rooms'

/** Brings the documents and the class channel up on an HTTP server that already has its request handler. */
export function attachRealtime(options: RealtimeOptions): Promise<Realtime> {
  const { httpServer, db, identify, log, nowMs = Date.now } = options
  const origins = new Set(options.allowedOrigins)
  const isAllowedOrigin = (origin: string | undefined) => origin !== undefined && origins.has(origin)

  const findMember = async (lessonId: string, memberId: string) =>
    (await listLessonMembers(db, lessonId)).find(({ id }) => id === memberId)

  const sendOut = (lessonId: string, memberId: string): void => {
    rooms.peek(lessonId)?.removeMember(memberId)
    channel.tellMember(lessonId, memberId, 'removed')
    channel.endMember(lessonId, memberId)
    channel.presenceOf(lessonId).remove(memberId)
    channel.tellPresence(lessonId)
    channel.tellRoster(lessonId)
  }

  const channel: ClassChannel = new ClassChannel({
    httpServer,
    rooms: () => rooms,
    identify,
    isAllowedOrigin,
    nowMs,
    log,
    removeMember: async (lessonId, memberId) => {
      const member = await findMember(lessonId, memberId)
      if (!member || !can(member.role, 'propose')) return false
      await updateLessonMember(db, memberId, { isRemoved: true })
      sendOut(lessonId, memberId)
      return true
    },
  })

  const rooms = new Rooms({
    db,
    log,
    nowMs,
    graceMs: options.graceMs,
    kept: (...ack) => channel.kept(...ack),
    keeping: (...state) => channel.keeping(...state),
    stageChanged: (lessonId) => channel.tellPresence(lessonId),
  })

  const documents = new DocumentServer({
    rooms,
    identify,
    isAllowedOrigin,
    isMember: async (lessonId, memberId) => (await findMember(lessonId, memberId)) !== undefined,
    nowMs,
    log,
  })
  httpServer.on('upgrade', documents.onUpgrade)

  const refresh = async (lessonId: string): Promise<void> => {
    const room = rooms.peek(lessonId)
    if (!room) return
    const lesson = await findLesson(db, lessonId)
    const isEnded = lesson?.status === 'ended'
    if (room.isEnded === isEnded) return
    room.isEnded = isEnded
    // They come back, and may then write again.
    room.closeWhere(() => true, CLOSE.restarting)
  }

  return Promise.resolve({
    lessonEnded: async (lessonId) => {
      const room = rooms.peek(lessonId)
      if (room) {
        await room.flush()
        room.isEnded = true
        channel.tellLesson(lessonId, 'ended')
        room.closeWhere(() => true, CLOSE.ended)
        await rooms.keepWhole(room)
      }
      channel.endLesson(lessonId)
    },
    lessonChanged: (lessonId) => {
      channel.tellLesson(lessonId, 'door')
      refresh(lessonId).catch((error: unknown) => log.error({ err: error, lessonId }, 'lesson not refreshed'))
    },
    rosterChanged: (lessonId) => channel.tellRoster(lessonId),
    memberChanged: async (lessonId, memberId) => {
      const member = await findMember(lessonId, memberId)
      if (!member || member.isRemoved) return sendOut(lessonId, memberId)
      rooms.peek(lessonId)?.closeWhere((identity) => identity.memberId === memberId, CLOSE.restarting)
      channel.tellMember(lessonId, memberId, 'role')
      channel.endMember(lessonId, memberId)
      channel.tellRoster(lessonId)
    },
    sessionEnded: (sessionId) => {
      for (const room of rooms.all()) {
        room.closeWhere((identity) => identity.sessionId === sessionId, CLOSE.signedOut)
      }
      channel.endSession(sessionId)
    },
    close: async () => {
      httpServer.off('upgrade', documents.onUpgrade)
      await Promise.all(rooms.all().map((room) => room.flush()))
      for (const room of rooms.all()) room.closeWhere(() => true, CLOSE.restarting)
      channel.close()
      documents.close()
      await rooms.close()
    },
  })
}

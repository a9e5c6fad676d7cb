import { useCallback, useEffect, useMemo, useState, useSyncExternalStore } from 'react'
import type { ChannelEvents, ChannelReply } from '@/shared/wire/rooms'
import type { LiveRoom, Who } from './live-room'
import { EMPTY_VIEW, type RoomView } from './room-view'

export type RoomHandle = Readonly<{
  /** Null until the code of live rooms has been loaded. */
  live: LiveRoom | null
  /** The documents, for the writers of `shared/board`; null until loaded, `sheet` and `chorus` also for who has none. */
  docs: LiveRoom['docs'] | null
  send: LiveRoom['send']
  /** The code of live rooms could not be loaded: there is no network. */
  isUnloadable: boolean
}>

const offline: LiveRoom['send'] = () => Promise.resolve<ChannelReply>({ ok: false, error: 'offline' })
const nothing = () => () => {}
const nextFrame = (work: () => void): void => {
  // A hidden page is given no frames, and must not go on collecting.
  if (document.visibilityState === 'visible') requestAnimationFrame(work)
  else setTimeout(work, 250)
}

/** The browser's storage, unless it is forbidden: merely asking throws then. */
function findStorage(): Storage | null {
  try {
    return window.localStorage
  } catch {
    return null
  }
}

/** Opens a lesson's room for as long as the component is there. `who` null: not known yet, nothing is opened. */
export function useRoomHandle(lessonId: string, who: Who | null): RoomHandle {
  const [live, setLive] = useState<LiveRoom | null>(null)
  const [isUnloadable, setUnloadable] = useState(false)
  const role = who?.role
  const memberId = who?.memberId ?? null
  useEffect(() => {
    if (!role) return
    let opened: LiveRoom | null = null
    let isGone = false
    const onStorage = ({ key }: StorageEvent) => opened?.onStorage(key)
    const onWake = () => {
      if (document.visibilityState === 'visible') opened?.wake()
    }
    import('./live-room')
      .then(({ LiveRoom }) => {
        if (isGone) return
        const surroundings = { origin: window.location.origin, storage: findStorage(), nextFrame }
        opened = new LiveRoom(lessonId, { role, memberId }, surroundings)
        setLive(opened)
      })
      .catch(() => setUnloadable(true))
    window.addEventListener('storage', onStorage)
    window.addEventListener('online', onWake)
    document.addEventListener('visibilitychange', onWake)
    return () => {
      isGone = true
      window.removeEventListener('storage', onStorage)
      window.removeEventListener('online', onWake)
      document.removeEventListener('visibilitychange', onWake)
      opened?.destroy()
      setLive(null)
    }
  }, [lessonId, role, memberId])
  return useMemo(
    () => ({
      live,
      docs: live?.docs ?? null,
      send: live ? live.send.bind(live) : offline,
      isUnloadable,
    }),
    [live, isUnloadable],
  )
}

/** One part of a room's view; the component is drawn again only when that part is another. */
export function useRoomPart<Part>({ live }: RoomHandle, select: (view: RoomView) => Part): Part {
  const getPart = useCallback(() => select(live?.getView() ?? EMPTY_VIEW), [live, select])
  return useSyncExternalStore(live?.subscribe ?? nothing, getPart, getPart)
}

const whole = (view: RoomView) => view

/** The room whole: its view, its documents, and the way to ask the class channel. */
export function useRoom(lessonId: string, who: Who | null): RoomView & RoomHandle {
  const handle = useRoomHandle(lessonId, who)
  const view = useRoomPart(handle, whole)
  return useMemo(() => ({ ...view, ...handle }), [view, handle])
}

/** Hears one kind of message of the class channel while the component is there. */
export function useRoomEvent<Name extends 'cue' | 'lesson'>(
  { live }: RoomHandle,
  name: Name,
  listener: ChannelEvents[Name],
): void {
  useEffect(() => live?.on(name, listener), [live, name, listener])
}

import { useEffect } from 'react'
import type { ChannelEvents } from '@/shared/wire/rooms'

type Cue = Parameters<ChannelEvents['cue']>[0]

/**
 * A wall that was opened from the lectern is the teacher's own page, to which the class channel sends no cues. It hears
 * them from the lectern through the browser they share.
 */
const nameOf = (lessonId: string): string => `bicinium.wall.${lessonId}`

const open = (lessonId: string): BroadcastChannel | null =>
  typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(nameOf(lessonId))

export function tellWallsHere(lessonId: string, cue: Cue): void {
  const channel = open(lessonId)
  channel?.postMessage(cue)
  channel?.close()
}

/** Hears the cues of a lectern in the same browser. Pages of other sites cannot speak on this channel. */
export function useCuesHere(lessonId: string, listener: ChannelEvents['cue']): void {
  useEffect(() => {
    const channel = open(lessonId)
    if (!channel) return
    channel.onmessage = ({ data }: MessageEvent<Cue>) => listener(data)
    return () => channel.close()
  }, [lessonId, listener])
}

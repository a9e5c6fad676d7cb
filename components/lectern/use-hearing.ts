import { useCallback, useState } from 'react'
import { usePlayer, useStopOnLeave } from '@/components/sound'
import type { LessonView } from '@/components/lesson/lesson-view'
import { lineWith } from '@/components/lesson/line-with'
import { DEFAULT_TEMPO, type PlaybackVoices } from '@/shared/playback'
import type { Line } from '@/shared/theory/note'
import type { HearingSettings } from './hearing-dialog'

/** A play or stop for the wall, as the class channel carries it. */
export type WallCue = Readonly<
  | { kind: 'stop' }
  | {
      kind: 'play'
      voices: PlaybackVoices
      fromBar: number
      toBar: number
      tempo: number
      proposal?: Record<string, { pitch: string | null; ticks: number; tied?: true | undefined }[]>
    }
>

/** Hearing from the lectern: on this device, or on the wall's. */
export function useHearing(view: LessonView, cueWall: (cue: WallCue) => void) {
  const player = usePlayer()
  useStopOnLeave()
  const [settings, setSettings] = useState<HearingSettings>({
    voices: 'both',
    tempo: DEFAULT_TEMPO,
    from: 'here',
  })
  /** What the wall was told to play: the lectern cannot hear when it ends, so it offers to stop until told otherwise. */
  const [wallId, setWallId] = useState<string | null>(null)

  const { play, stop: stopHere } = player
  const stop = useCallback(() => {
    stopHere()
    if (wallId !== null) cueWall({ kind: 'stop' })
    setWallId(null)
  }, [stopHere, wallId, cueWall])

  const hear = useCallback(
    (id: string, bars: readonly number[], proposal?: Line) => {
      const fromBar = bars[0] ?? 1
      const toBar = bars.at(-1) ?? view.barCount
      const { voices, tempo, from } = settings
      if (from === 'wall') {
        const notes = proposal && copyLine(proposal)
        cueWall({ kind: 'play', voices, fromBar, toBar, tempo, ...(notes ? { proposal: notes } : {}) })
        setWallId(id)
        return
      }
      play({
        id,
        score: {
          cantus: view.written.cantus,
          line: proposal ? lineWith(view.line, proposal) : view.line,
          setAside: [...view.setAside],
        },
        voices,
        fromBar,
        toBar,
        tempo,
      })
    },
    [settings, view, cueWall, play],
  )

  const playingId = player.playingId ?? (settings.from === 'wall' ? wallId : null)
  return { settings, setSettings, hear, stop, playingId, problem: player.problem }
}

type PlayCue = Extract<WallCue, { kind: 'play' }>

const copyLine = (line: Line): NonNullable<PlayCue['proposal']> =>
  Object.fromEntries(Object.entries(line).map(([bar, notes]) => [bar, notes.map((note) => ({ ...note }))]))

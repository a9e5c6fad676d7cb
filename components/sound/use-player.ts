import { useEffect, useSyncExternalStore } from 'react'
import { useWords } from '@/components/words'
import type { PlaybackPosition } from '@/shared/playback'
import type { PitchName } from '@/shared/theory/pitch'
import { pagePlayer, pageVolume } from './page-player'
import type { PlayRequest } from './player'

export type PlayerControls = Readonly<{
  play: (request: PlayRequest) => void
  /** Strikes one note. */
  strike: (pitch: PitchName) => void
  stop: () => void
  isLoading: boolean
  isPlaying: boolean
  /** The `id` given to `play`, while that hearing is loading or playing. */
  playingId: string | null
  /** Start of the bar that sounds. Changes once a bar, so it is cheap; `usePlayhead` moves within the bar. */
  position: PlaybackPosition | null
  /** In words, why nothing is heard; null when all is well. */
  problem: string | null
}>

/**
 * The page's player. Nothing sounds and nothing is fetched until `play` or `strike` is called, and the last of several
 * calls is the one that is heard.
 */
export function usePlayer(): PlayerControls {
  const words = useWords()
  const state = useSyncExternalStore(pagePlayer.subscribe, pagePlayer.getState, pagePlayer.getState)
  return {
    play: pagePlayer.play,
    strike: pagePlayer.strike,
    stop: pagePlayer.stop,
    isLoading: state.status === 'loading',
    isPlaying: state.status === 'playing',
    playingId: state.id,
    position: barStart(state.bar),
    problem: state.problem && words.sound.problems[state.problem],
  }
}

/** Silence when the screen is left: a hearing does not outlive the score it was asked from. */
export function useStopOnLeave(): void {
  useEffect(() => () => pagePlayer.stop(), [])
}

/** Where the playhead is, at every frame. Use it in a small component that draws only the playhead. */
export function usePlayhead(): PlaybackPosition | null {
  return useSyncExternalStore(pagePlayer.subscribePlayhead, pagePlayer.getPlayhead, () => null)
}

export function useVolume(): readonly [volume: number, setVolume: (volume: number) => void] {
  return [useSyncExternalStore(pageVolume.subscribe, pageVolume.get, pageVolume.get), pageVolume.set]
}

const starts = new Map<number, PlaybackPosition>()

/** The same object for the same bar, so that a memoised score is not drawn anew. */
function barStart(bar: number | null): PlaybackPosition | null {
  if (bar === null) return null
  const known = starts.get(bar) ?? { bar, fraction: 0 }
  starts.set(bar, known)
  return known
}

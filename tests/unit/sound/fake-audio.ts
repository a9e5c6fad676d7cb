import type { Piano } from '@/components/sound/piano'
import { createPlayer, type Player } from '@/components/sound/player'

/** One note as it was given to the audio clock. */
export type Scheduled = {
  startSeconds: number
  stopSeconds: number
  playbackRate: number
  onended: (() => void) | null
}

/** An audio context on a clock that the test turns by hand, with everything that was scheduled on it. */
export function createFakeAudio() {
  const scheduled: Scheduled[] = []
  const stateListeners = new Set<() => void>()
  const gain = () => ({
    gain: { setValueAtTime() {}, linearRampToValueAtTime() {}, value: 1 },
    connect() {},
    disconnect() {},
  })
  const context = {
    currentTime: 0,
    outputLatency: 0,
    state: 'running' as 'running' | 'suspended',
    createGain: gain,
    createBufferSource() {
      const note: Scheduled = { startSeconds: 0, stopSeconds: 0, playbackRate: 1, onended: null }
      return {
        playbackRate: {
          set value(rate: number) {
            note.playbackRate = rate
          },
        },
        set onended(callback: () => void) {
          note.onended = callback
        },
        connect() {},
        start(at: number) {
          note.startSeconds = at
          scheduled.push(note)
        },
        stop(at: number) {
          note.stopSeconds = at
        },
      }
    },
    addEventListener: (_: string, listener: () => void) => stateListeners.add(listener),
    removeEventListener: (_: string, listener: () => void) => stateListeners.delete(listener),
  }
  return {
    context,
    scheduled,
    setContextState(state: 'running' | 'suspended') {
      context.state = state
      for (const listener of [...stateListeners]) listener()
    },
  }
}

export type FakeStage = ReturnType<typeof createStage>

/** A player whose loading, waking, frames and wall clock the test decides. */
export function createStage() {
  const audio = createFakeAudio()
  const loads: { midis: readonly number[]; succeed: () => void; fail: () => void }[] = []
  const frames = new Map<number, () => void>()
  const delays = new Set<() => void>()
  let nextFrame = 1
  const stage = { isAwake: true, hasAudio: true }
  const piano: Piano = {
    prepare: (midis) =>
      new Promise((resolve, reject) => {
        const notes = midis.map(
          (midi) => [midi, { buffer: null as never, onsetSeconds: 0, playbackRate: 1 }] as const,
        )
        loads.push({
          midis,
          succeed: () => resolve(new Map(notes)),
          fail: () => reject(new Error('refused')),
        })
      }),
  }
  const player: Player = createPlayer({
    openAudio: () =>
      stage.hasAudio
        ? { context: audio.context as unknown as AudioContext, output: null as never, piano }
        : null,
    wake: async () => stage.isAwake,
    requestFrame: (callback) => {
      frames.set(nextFrame, callback)
      return nextFrame++
    },
    cancelFrame: (handle) => frames.delete(handle),
    after: (_, callback) => {
      delays.add(callback)
      return () => delays.delete(callback)
    },
  })
  return {
    ...audio,
    player,
    loads,
    stage,
    frames,
    delays,
    /** Turns the audio clock on and draws a frame. */
    advanceTo(seconds: number) {
      audio.context.currentTime = seconds
      const due = [...frames.values()]
      frames.clear()
      for (const callback of due) callback()
    },
    passWallClock() {
      for (const callback of [...delays]) callback()
    },
  }
}

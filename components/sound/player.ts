import { createTimeline, positionAt } from '@/shared/playback'
import type { PlaybackPosition, PlaybackRequest, PlaybackScore, Timeline } from '@/shared/playback'
import { frequencyHertz, midiNumber } from '@/shared/theory/frequency'
import { parsePitch, type PitchName } from '@/shared/theory/pitch'
import { startHearing, type Hearing } from './hearing'
import type { Piano } from './piano'

/**
 * Why nothing is heard. `no-audio`: the browser has none. `asleep`: it lets a page sound only after a touch of it.
 * `no-device`: its audio clock stands still. `not-loaded`: a recording could not be fetched. `nothing`: nothing is written there.
 */
export type PlayerProblem = 'no-audio' | 'asleep' | 'no-device' | 'not-loaded' | 'nothing'

export type PlayRequest = PlaybackRequest &
  Readonly<{
    score: PlaybackScore
    /** Whose hearing it is, so that one of several buttons can show itself as playing. */
    id?: string
  }>

export type PlayerState = Readonly<{
  /** A single note that is struck leaves it idle: there is nothing to stop. */
  status: 'idle' | 'loading' | 'playing'
  /** The `id` of what is loading or playing. */
  id: string | null
  /** The bar that sounds now. Changes once a bar; the smooth playhead is a store of its own. */
  bar: number | null
  problem: PlayerProblem | null
}>

export type Player = Readonly<{
  /** Stops what sounds and plays this. Call it only when someone asked to hear: the page is silent otherwise. */
  play: (request: PlayRequest) => void
  /** Strikes one note, as a rung of the ladder does. */
  strike: (pitch: PitchName) => void
  stop: () => void
  getState: () => PlayerState
  subscribe: (listener: () => void) => () => void
  /** Read at every frame while playing. */
  getPlayhead: () => PlaybackPosition | null
  subscribePlayhead: (listener: () => void) => () => void
}>

/** What the player needs of the page, so that its decisions can be tested without one. */
export type PlayerParts = Readonly<{
  /** Makes or gives the one audio context, asking it to wake; null where the browser has none. Called in the user's gesture. */
  openAudio: () => Readonly<{ context: AudioContext; output: AudioNode; piano: Piano }> | null
  /** Resolves when the context runs, or to false when the browser keeps it asleep. */
  wake: (context: AudioContext) => Promise<boolean>
  requestFrame: (callback: () => void) => number
  cancelFrame: (handle: number) => void
  /** Calls back once after so many milliseconds of the wall's clock; answers with the way to call it off. */
  after: (delayMs: number, callback: () => void) => () => void
}>

/** Time for the browser to take up what was scheduled, and for a hearing before it to fade. */
const LEAD_SECONDS = 0.04
const STRIKE_SECONDS = 1.2
/** An audio clock that has not moved by then has no device behind it. */
const DEVICE_CHECK_MS = 1500

const IDLE: PlayerState = { status: 'idle', id: null, bar: null, problem: null }

/** One player a page, so that no two hearings ever overlap: a later request ends an earlier one, loading or playing. */
export function createPlayer(parts: PlayerParts): Player {
  const listeners = new Set<() => void>()
  const playheadListeners = new Set<() => void>()
  let state = IDLE
  let playhead: PlaybackPosition | null = null
  /** Undoes the hearing that is loading or playing. */
  let end: (() => void) | null = null

  const setState = (next: PlayerState): void => {
    state = next
    for (const listener of listeners) listener()
  }
  const setPlayhead = (next: PlaybackPosition | null): void => {
    playhead = next
    for (const listener of playheadListeners) listener()
  }

  function finish(problem: PlayerProblem | null): void {
    end?.()
    end = null
    if (playhead) setPlayhead(null)
    if (state.status !== 'idle' || state.problem !== problem) setState({ ...IDLE, problem })
  }

  async function perform(timeline: Timeline, id: string | null, isHearing: boolean): Promise<void> {
    finish(null)
    if (timeline.events.length === 0) return finish('nothing')
    const audio = parts.openAudio()
    if (!audio) return finish('no-audio')
    let isCurrent = true
    end = () => (isCurrent = false)
    if (isHearing) setState({ status: 'loading', id, bar: null, problem: null })

    const loading = audio.piano.prepare(timeline.events.map(({ midi }) => midi)).catch(() => null)
    const isAwake = await parts.wake(audio.context)
    if (!isCurrent) return
    if (!isAwake) return finish('asleep')
    const notes = await loading
    if (!isCurrent) return
    if (!notes) return finish('not-loaded')

    const startSeconds = audio.context.currentTime + LEAD_SECONDS
    const onEnded = () => isCurrent && finish(null)
    const hearing = startHearing(audio.context, audio.output, timeline, notes, startSeconds, onEnded)
    const unfollow = follow(audio.context, hearing, timeline)
    end = () => {
      isCurrent = false
      unfollow()
      hearing.stop()
    }
    if (isHearing) setState({ status: 'playing', id, bar: null, problem: null })
  }

  /** Moves the playhead with the audio clock, and watches that the clock moves and stays awake. */
  function follow(context: AudioContext, hearing: Hearing, timeline: Timeline): () => void {
    const begunSeconds = context.currentTime
    const step = (): void => {
      frame = parts.requestFrame(step)
      const heardSeconds = context.currentTime - (context.outputLatency || 0) - hearing.startSeconds
      const position = positionAt(timeline, heardSeconds)
      if (position) setPlayhead(position)
      if (position && position.bar !== state.bar) setState({ ...state, bar: position.bar })
    }
    let frame = parts.requestFrame(step)
    const callOff = parts.after(DEVICE_CHECK_MS, () => {
      if (context.currentTime === begunSeconds) finish('no-device')
    })
    // A telephone call, or the system, may take the sound away in the middle.
    const onStateChange = (): void => {
      if (context.state !== 'running') finish('asleep')
    }
    context.addEventListener('statechange', onStateChange)
    return () => {
      parts.cancelFrame(frame)
      callOff()
      context.removeEventListener('statechange', onStateChange)
    }
  }

  return {
    play: ({ score, id, ...request }) => void perform(createTimeline(score, request), id ?? null, true),
    strike: (pitch) => void perform(oneNote(pitch), null, false),
    stop: () => finish(null),
    getState: () => state,
    subscribe: (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    getPlayhead: () => playhead,
    subscribePlayhead: (listener) => {
      playheadListeners.add(listener)
      return () => playheadListeners.delete(listener)
    },
  }
}

/** A hearing of a single note, which belongs to no bar. */
function oneNote(name: PitchName): Timeline {
  const parsed = parsePitch(name)
  if (!parsed.ok) return { events: [], bars: [], totalSeconds: 0 }
  const event = {
    voice: 'line' as const,
    bar: 0,
    startSeconds: 0,
    durationSeconds: STRIKE_SECONDS,
    midi: midiNumber(parsed.value),
    hertz: frequencyHertz(parsed.value),
  }
  return { events: [event], bars: [], totalSeconds: STRIKE_SECONDS }
}

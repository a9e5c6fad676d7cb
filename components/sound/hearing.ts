import type { Timeline } from '@/shared/playback'
import type { PianoNote } from './piano'

/** A note goes on sounding a little past its end, as a pianist's legato does. */
const RELEASE_SECONDS = 0.12
const STOP_FADE_SECONDS = 0.025

/** What is being played now: every note of it is in the audio clock's hands, so a hidden tab goes on in time. */
export type Hearing = Readonly<{
  /** When it began, in the audio context's time. */
  startSeconds: number
  /** Fades out at once; nothing of it is heard after `STOP_FADE_SECONDS`. */
  stop: () => void
}>

/** Schedules a whole timeline from `startSeconds` on. `onEnded` is called when the last note has died, not when stopped. */
export function startHearing(
  context: BaseAudioContext,
  output: AudioNode,
  timeline: Timeline,
  notes: ReadonlyMap<number, PianoNote>,
  startSeconds: number,
  onEnded: () => void,
): Hearing {
  const bus = context.createGain()
  bus.connect(output)
  let isStopped = false
  const sources = timeline.events.flatMap((event) => {
    const note = notes.get(event.midi)
    if (!note) return []
    const strikeAt = startSeconds + event.startSeconds
    const releaseAt = strikeAt + event.durationSeconds
    const envelope = context.createGain()
    envelope.gain.setValueAtTime(1, releaseAt)
    envelope.gain.linearRampToValueAtTime(0, releaseAt + RELEASE_SECONDS)
    envelope.connect(bus)
    const source = context.createBufferSource()
    source.buffer = note.buffer
    source.playbackRate.value = note.playbackRate
    source.connect(envelope)
    source.start(strikeAt, note.onsetSeconds)
    source.stop(releaseAt + RELEASE_SECONDS)
    source.onended = () => envelope.disconnect()
    return [{ source, envelope, releaseAt }]
  })
  const last = sources.reduce<(typeof sources)[number] | null>(
    (latest, each) => (latest && latest.releaseAt >= each.releaseAt ? latest : each),
    null,
  )
  if (last) {
    last.source.onended = () => {
      bus.disconnect()
      if (!isStopped) onEnded()
    }
  }
  return {
    startSeconds,
    stop() {
      if (isStopped) return
      isStopped = true
      const now = context.currentTime
      bus.gain.setValueAtTime(1, now)
      bus.gain.linearRampToValueAtTime(0, now + STOP_FADE_SECONDS)
      for (const { source } of sources) source.stop(now + STOP_FADE_SECONDS)
    },
  }
}

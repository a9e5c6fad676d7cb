import { nearestSample } from './nearest-sample'
import type { Sample } from './samples/samples'

/** A decoded recording and where in it the hammer strikes: some decoders leave the encoder's padding in front. */
type Recording = Readonly<{ buffer: AudioBuffer; onsetSeconds: number }>

/** A note ready to sound: a recording, and the rate that brings it to pitch. */
export type PianoNote = Recording & Readonly<{ playbackRate: number }>

export type Piano = Readonly<{
  /** Fetches and decodes what these notes need and is not here yet. Rejects when a recording cannot be had. */
  prepare: (midis: readonly number[]) => Promise<ReadonlyMap<number, PianoNote>>
}>

const ONSET_LEVEL = 0.004
const BEFORE_ONSET_SECONDS = 0.002

/**
 * A piano that fetches only the recordings that are asked for, and each once. `decode` gets bytes of its own.
 * A recording that failed is fetched again the next time it is asked for.
 */
export function createPiano(
  samples: readonly Sample[],
  fetchBytes: (address: string) => Promise<ArrayBuffer>,
  decode: (bytes: ArrayBuffer) => Promise<AudioBuffer>,
): Piano {
  const sampleMidis = samples.map(({ midi }) => midi)
  const recordings = new Map<number, Promise<Recording>>()

  async function loadRecording(midi: number): Promise<Recording> {
    const sample = samples.find((each) => each.midi === midi) as Sample
    const buffer = await decode(await fetchBytes(sample.address))
    return { buffer, onsetSeconds: onsetOf(buffer) }
  }

  function recordingOf(midi: number): Promise<Recording> {
    const known = recordings.get(midi)
    if (known) return known
    const loading = loadRecording(midi)
    recordings.set(midi, loading)
    loading.catch(() => recordings.delete(midi))
    return loading
  }

  return {
    async prepare(midis) {
      const notes = [...new Set(midis)].map(async (midi): Promise<[number, PianoNote]> => {
        const { sampleMidi, playbackRate } = nearestSample(sampleMidis, midi)
        return [midi, { ...(await recordingOf(sampleMidi)), playbackRate }]
      })
      return new Map(await Promise.all(notes))
    },
  }
}

function onsetOf(buffer: AudioBuffer): number {
  const samples = buffer.getChannelData(0)
  const first = samples.findIndex((sample) => Math.abs(sample) > ONSET_LEVEL)
  return Math.max(0, first / buffer.sampleRate - BEFORE_ONSET_SECONDS)
}

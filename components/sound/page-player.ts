import { createPiano, type Piano } from './piano'
import { createPlayer } from './player'
import { SAMPLES } from './samples/samples'
import { createVolumeStore, gainOf } from './volume'

/** How long a browser may take to wake its audio in the user's own gesture. */
const WAKE_MS = 800

type Audio = Readonly<{ context: AudioContext; output: GainNode; piano: Piano }>

const storage = (): Storage | null => {
  try {
    return window.localStorage
  } catch {
    return null
  }
}

export const pageVolume = createVolumeStore(typeof window === 'undefined' ? null : storage())

let audio: Audio | null = null

/** Made when sound is first asked for, never before: a page that is not asked keeps no audio thread and fetches nothing. */
function openAudio(): Audio | null {
  audio ??= createAudio()
  // In the user's gesture, before anything is awaited: some browsers grant sound to no later moment.
  if (audio && audio.context.state !== 'running') audio.context.resume().catch(() => undefined)
  return audio
}

function createAudio(): Audio | null {
  if (typeof AudioContext === 'undefined') return null
  try {
    const context = new AudioContext({ latencyHint: 'interactive' })
    const output = context.createGain()
    output.gain.value = gainOf(pageVolume.get())
    output.connect(context.destination)
    pageVolume.subscribe(() => {
      // A jump of gain clicks: it slides over a few milliseconds.
      output.gain.setTargetAtTime(gainOf(pageVolume.get()), context.currentTime, 0.015)
    })
    return {
      context,
      output,
      piano: createPiano(SAMPLES, fetchBytes, (bytes) => context.decodeAudioData(bytes)),
    }
  } catch {
    return null
  }
}

async function fetchBytes(address: string): Promise<ArrayBuffer> {
  const response = await fetch(address)
  if (!response.ok) throw new Error(`A recording was refused with status ${response.status}.`)
  return response.arrayBuffer()
}

function wake(context: AudioContext): Promise<boolean> {
  if (context.state === 'running') return Promise.resolve(true)
  return new Promise((resolve) => {
    const settle = (isAwake: boolean): void => {
      window.clearTimeout(timer)
      context.removeEventListener('statechange', onStateChange)
      if (!isAwake) wakeAtNextTouch(context)
      resolve(isAwake)
    }
    const onStateChange = (): void => {
      if (context.state === 'running') settle(true)
    }
    const timer = window.setTimeout(() => settle(context.state === 'running'), WAKE_MS)
    context.addEventListener('statechange', onStateChange)
  })
}

/** A wall is told to play by the lectern and may not have been touched: the next touch lets it sound from then on. */
function wakeAtNextTouch(context: AudioContext): void {
  const onTouch = (): void => {
    window.removeEventListener('pointerdown', onTouch)
    window.removeEventListener('keydown', onTouch)
    context.resume().catch(() => undefined)
    if (pagePlayer.getState().problem === 'asleep') pagePlayer.stop()
  }
  window.addEventListener('pointerdown', onTouch)
  window.addEventListener('keydown', onTouch)
}

export const pagePlayer = createPlayer({
  openAudio,
  wake,
  requestFrame: (callback) => window.requestAnimationFrame(callback),
  cancelFrame: (handle) => window.cancelAnimationFrame(handle),
  after: (delayMs, callback) => {
    const timer = window.setTimeout(callback, delayMs)
    return () => window.clearTimeout(timer)
  },
})

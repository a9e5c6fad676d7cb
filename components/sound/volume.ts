/** How loud, from 0 to 1. Begins low: whoever hears it first may wear headphones, or stand by a projector's loudspeakers. */
export const FIRST_VOLUME = 0.35

const KEY = 'bicinium.volume'
/** Full volume leaves room for two voices at once without clipping. */
const FULL_GAIN = 0.8

export type VolumeStore = Readonly<{
  get: () => number
  set: (volume: number) => void
  subscribe: (listener: () => void) => () => void
}>

/** Gain of a volume: the ear hears ratios, so a slider's middle should be about half as loud. */
export const gainOf = (volume: number): number => FULL_GAIN * volume ** 1.6

/** Remembers the volume in `storage`; where that is missing or full, for this visit only. */
export function createVolumeStore(storage: Pick<Storage, 'getItem' | 'setItem'> | null): VolumeStore {
  const listeners = new Set<() => void>()
  let volume = readVolume(storage)
  return {
    get: () => volume,
    set(next) {
      volume = Math.min(1, Math.max(0, next))
      try {
        storage?.setItem(KEY, String(volume))
      } catch {
        // A private window may refuse storage: the volume then holds until the page is left.
      }
      for (const listener of listeners) listener()
    },
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
  }
}

function readVolume(storage: Pick<Storage, 'getItem'> | null): number {
  try {
    const stored = storage?.getItem(KEY)
    const volume = stored == null || stored === '' ? Number.NaN : Number(stored)
    return volume >= 0 && volume <= 1 ? volume : FIRST_VOLUME
  } catch {
    return FIRST_VOLUME
  }
}

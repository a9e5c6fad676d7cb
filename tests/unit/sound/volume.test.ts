import { createVolumeStore, FIRST_VOLUME, gainOf } from '@/components/sound/volume'

const storageOf = (value: string | null) => {
  const kept = new Map(value === null ? [] : [['bicinium.volume', value]])
  return {
    kept,
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, text: string) => void kept.set(key, text),
  }
}

test('the first visit starts quiet: well under a quarter of full strength', () => {
  expect(createVolumeStore(storageOf(null)).get()).toBe(FIRST_VOLUME)
  expect(gainOf(FIRST_VOLUME)).toBeLessThan(gainOf(1) / 4)
})

test('a volume is remembered for the next visit, silence too', () => {
  const storage = storageOf(null)
  createVolumeStore(storage).set(0)
  expect(createVolumeStore(storage).get()).toBe(0)
})

test.each(['', 'loud', '7', '-1', 'NaN'])('a stored %p is no volume: it starts quiet', (stored) => {
  expect(createVolumeStore(storageOf(stored)).get()).toBe(FIRST_VOLUME)
})

test('a browser that refuses storage keeps the volume for the visit', () => {
  const refuses = () => {
    throw new Error('refused')
  }
  const store = createVolumeStore({ getItem: refuses, setItem: refuses })
  let told = 0
  store.subscribe(() => (told += 1))
  store.set(2)
  expect(store.get()).toBe(1)
  expect(told).toBe(1)
})

test('two voices at full volume cannot clip: recordings peak below 0.6', () => {
  expect(2 * 0.6 * gainOf(1)).toBeLessThan(1)
})

import { nearestSample } from '@/components/sound/nearest-sample'
import { createPiano } from '@/components/sound/piano'

const SAMPLES = [61, 65, 69].map((midi) => ({ midi, address: `/${midi}.mp3` }))

/** A decoded recording of 100 samples at 100 Hz, silent up to `onset`. */
const recording = (onset: number) =>
  ({
    sampleRate: 100,
    getChannelData: () => Float32Array.from({ length: 100 }, (_, i) => (i < onset ? 0 : 0.5)),
  }) as unknown as AudioBuffer

test.each([
  [69, 69, 0],
  [70, 69, 1],
  [67, 65, 2],
  [63, 61, 2],
  [30, 61, -31],
  [96, 69, 27],
])('note %d sounds from recording %d, %d semitones away', (midi, sampleMidi, semitones) => {
  const stand = nearestSample(
    SAMPLES.map((sample) => sample.midi),
    midi,
  )
  expect(stand.sampleMidi).toBe(sampleMidi)
  expect(12 * Math.log2(stand.playbackRate)).toBeCloseTo(semitones)
})

test('a recording is fetched once, however often and by however many notes it is asked for', async () => {
  const fetched: string[] = []
  const piano = createPiano(
    SAMPLES,
    async (address) => {
      fetched.push(address)
      return new ArrayBuffer(0)
    },
    async () => recording(0),
  )
  await Promise.all([piano.prepare([69, 70, 69]), piano.prepare([71])])
  await piano.prepare([68, 65])
  expect(fetched).toEqual(['/69.mp3', '/65.mp3'])
})

test('the padding an encoder leaves in front is passed over, to just before the hammer', async () => {
  const piano = createPiano(
    SAMPLES,
    async () => new ArrayBuffer(0),
    async () => recording(50),
  )
  expect((await piano.prepare([69])).get(69)?.onsetSeconds).toBeCloseTo(0.498)
})

test('a recording that failed is fetched again when it is next asked for', async () => {
  let tries = 0
  const piano = createPiano(
    SAMPLES,
    async () => {
      tries += 1
      if (tries === 1) throw new Error('offline')
      return new ArrayBuffer(0)
    },
    async () => recording(0),
  )
  await expect(piano.prepare([69])).rejects.toThrow('offline')
  expect((await piano.prepare([69])).has(69)).toBe(true)
})

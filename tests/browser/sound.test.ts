import { readFile } from 'node:fs/promises'
import { build } from 'esbuild'
import type { Browser, Page } from 'playwright-core'
import { launchChromium } from './support/chromium'
import { measureCents } from './support/measure-cents'

const RATE_HZ = 44100
const ORIGIN = 'http://piano.test'

/** The app's own piano and hearing, bundled for a blank page: what a browser decodes is what is measured. */
const ENTRY = `
  import { createPiano } from '@/components/sound/piano'
  import { startHearing } from '@/components/sound/hearing'
  import { SAMPLES } from '@/components/sound/samples/samples'
  window.renderNotes = async (events, seconds) => {
    const context = new OfflineAudioContext(1, seconds * ${RATE_HZ}, ${RATE_HZ})
    const piano = createPiano(
      SAMPLES,
      async (address) => (await fetch(address)).arrayBuffer(),
      (bytes) => context.decodeAudioData(bytes),
    )
    const notes = await piano.prepare(events.map(({ midi }) => midi))
    const timeline = { events, bars: [], totalSeconds: seconds }
    startHearing(context, context.destination, timeline, notes, 0, () => undefined)
    const samples = (await context.startRendering()).getChannelData(0)
    return btoa(Array.from(new Uint8Array(samples.buffer), (byte) => String.fromCharCode(byte)).join(''))
  }
`

declare global {
  interface Window {
    renderNotes: (events: readonly object[], seconds: number) => Promise<string>
  }
}

let browser: Browser
let page: Page

beforeAll(async () => {
  const bundle = await build({
    stdin: { contents: ENTRY, resolveDir: process.cwd(), loader: 'ts' },
    bundle: true,
    write: false,
    outdir: 'out',
    format: 'iife',
    loader: { '.mp3': 'file' },
    assetNames: '[name]',
    publicPath: '/',
    alias: { '@': process.cwd() },
  })
  const files = new Map(bundle.outputFiles.map(({ path, contents }) => [path.split('/').at(-1), contents]))
  browser = await launchChromium()
  page = await browser.newPage()
  await page.route(`${ORIGIN}/**`, (route) => {
    const name = new URL(route.request().url()).pathname.slice(1)
    const body = files.get(name)
    if (name === '')
      return route.fulfill({ contentType: 'text/html', body: '<script src="/stdin.js"></script>' })
    return body ? route.fulfill({ body: Buffer.from(body) }) : route.fulfill({ status: 404 })
  })
  await page.goto(ORIGIN)
}, 60_000)

afterAll(() => browser?.close())

const hertzOf = (midi: number): number => 440 * 2 ** ((midi - 69) / 12)

async function render(midi: number, durationSeconds: number, startSeconds = 0): Promise<Float32Array> {
  const event = { voice: 'line', bar: 1, startSeconds, durationSeconds, midi, hertz: hertzOf(midi) }
  const base64 = await page.evaluate((it) => window.renderNotes([it], 2), event)
  const bytes = Uint8Array.from(Buffer.from(base64, 'base64'))
  return new Float32Array(bytes.buffer)
}

/** Recorded notes and notes made from a neighbour, over the range of the five clefs and beyond. */
test.each([33, 40, 45, 50, 53, 57, 60, 62, 66, 67, 69, 71, 74, 76, 81, 86, 93])(
  'MIDI note %d sounds within 5 cents of equal temperament at A4 = 440 Hz',
  async (midi) => {
    const samples = (await render(midi, 2)).slice(0.1 * RATE_HZ, 1.6 * RATE_HZ)
    const cents = measureCents(samples, RATE_HZ, hertzOf(midi))
    expect(cents).not.toBeNull()
    expect(Math.abs(cents as number)).toBeLessThanOrEqual(5)
  },
)

test('a note is struck on time, within 15 ms, whatever padding the encoder left', async () => {
  const samples = await render(69, 1, 0.5)
  const struckAt = samples.findIndex((sample) => Math.abs(sample) > 0.02) / RATE_HZ
  expect(struckAt).toBeGreaterThan(0.495)
  expect(struckAt).toBeLessThan(0.515)
})

test('a note ends with its duration and a short release', async () => {
  const samples = await render(60, 1)
  const loudest = (from: number, to: number) =>
    samples.slice(from * RATE_HZ, to * RATE_HZ).reduce((peak, sample) => Math.max(peak, Math.abs(sample)), 0)
  expect(loudest(0.8, 1)).toBeGreaterThan(0.01)
  expect(loudest(1.2, 2)).toBe(0)
})

test('the recordings ship with their licence, and weigh under 400 KB in all', async () => {
  const folder = 'components/sound/samples'
  const source = await readFile(`${folder}/samples.ts`, 'utf8')
  const names = [...source.matchAll(/'\.\/(\w+\.mp3)'/g)].map(([, name]) => name as string)
  const sizes = await Promise.all(names.map(async (name) => (await readFile(`${folder}/${name}`)).length))
  expect(names).toHaveLength(16)
  expect(sizes.reduce((sum, size) => sum + size, 0)).toBeLessThan(400_000)
  expect(await readFile(`${folder}/LICENSE.txt`, 'utf8')).toContain('Permission is hereby granted')
})

/**
 * Makes the piano: renders single notes of a General MIDI sound font, tunes each to equal temperament at A4 = 440 Hz
 * (ISO 16), levels them and writes small mono MP3 files beside this script. Run by hand, on Debian:
 *
 *   apt-get install --no-install-recommends fluidsynth fluid-soundfont-gm ffmpeg
 *   node components/sound/samples/build.mjs
 *
 * The font is FluidR3 GM (MIT licence, see LICENSE.txt). It prints what it measured of every note.
 */
import { execFileSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

const SOUND_FONT = process.env.SOUND_FONT ?? '/usr/share/sounds/sf2/FluidR3_GM.sf2'
const HERE = new URL('.', import.meta.url).pathname
const RATE_HZ = 44100
const LOWEST_MIDI = 33 // A1
const HIGHEST_MIDI = 96 // C7
const STEP_SEMITONES = 4
const FIRST_HALF_SECOND_RMS = 0.16
const LETTERS = ['C', 'Cs', 'D', 'Ds', 'E', 'F', 'Fs', 'G', 'Gs', 'A', 'As', 'B']

const nameOf = (midi) => LETTERS[midi % 12] + String(Math.floor(midi / 12) - 1)
const hertzOf = (midi) => 440 * 2 ** ((midi - 69) / 12)

/** Low strings ring longer than high ones; past this the note has died away enough to fade. */
const ringSeconds = (midi) => (midi < 62 ? 5 : midi < 76 ? 4 : 2.5)

/** A MIDI file of one note, held for `seconds`, then silence for the release. */
function midiOf(note, seconds) {
  const ticks = Math.round(seconds * 960)
  const variable = (n) => {
    const bytes = [n & 127]
    for (let rest = n >> 7; rest > 0; rest >>= 7) bytes.unshift((rest & 127) | 128)
    return bytes
  }
  const track = [
    [0, 0xc0, 0],
    [0, 0x90, note, 84],
    [...variable(ticks), 0x80, note, 0],
    [...variable(480), 0xff, 0x2f, 0],
  ].flat()
  const length = Buffer.alloc(4)
  length.writeUInt32BE(track.length)
  const header = [0x4d, 0x54, 0x68, 0x64, 0, 0, 0, 6, 0, 0, 0, 1, 0x01, 0xe0]
  return Buffer.concat([Buffer.from([...header, 0x4d, 0x54, 0x72, 0x6b]), length, Buffer.from(track)])
}

/** The channels of a raw 16-bit stereo recording, as numbers from -1 to 1. */
function channelsOf(raw) {
  const frames = raw.length >> 2
  const left = new Float64Array(frames)
  const right = new Float64Array(frames)
  for (let i = 0; i < frames; i += 1) {
    left[i] = raw.readInt16LE(4 * i) / 32768
    right[i] = raw.readInt16LE(4 * i + 2) / 32768
  }
  return [left, right]
}

const rms = (samples, from, to) => {
  let sum = 0
  for (let i = from; i < to; i += 1) sum += samples[i] ** 2
  return Math.sqrt(sum / (to - from))
}

/** Strength of one frequency over a Hann-windowed stretch. */
function strengthAt(samples, from, count, hertz) {
  let re = 0
  let im = 0
  for (let i = 0; i < count; i += 1) {
    const windowed = samples[from + i] * (0.5 - 0.5 * Math.cos((2 * Math.PI * i) / count))
    const angle = (2 * Math.PI * hertz * i) / RATE_HZ
    re += windowed * Math.cos(angle)
    im -= windowed * Math.sin(angle)
  }
  return Math.hypot(re, im)
}

/** How many cents the fundamental lies above where it should, looked for within 40 cents by golden section. */
function centsOff(samples, from, midi) {
  const count = Math.min(samples.length - from, Math.round(1.5 * RATE_HZ))
  const strength = (cents) => strengthAt(samples, from, count, hertzOf(midi) * 2 ** (cents / 1200))
  let best = 0
  for (let cents = -40; cents <= 40; cents += 2) if (strength(cents) > strength(best)) best = cents
  let [low, high] = [best - 2, best + 2]
  const ratio = (Math.sqrt(5) - 1) / 2
  while (high - low > 0.05) {
    const [a, b] = [high - ratio * (high - low), low + ratio * (high - low)]
    if (strength(a) > strength(b)) high = b
    else low = a
  }
  return (low + high) / 2
}

const folder = mkdtempSync(join(tmpdir(), 'piano-'))
const [midiFile, rawFile, tuned] = ['note.mid', 'note.raw', 'tuned.wav'].map((name) => join(folder, name))

function render(midi) {
  writeFileSync(midiFile, midiOf(midi, ringSeconds(midi)))
  execFileSync('fluidsynth', [
    ...['-ni', '-q', '-R', '0', '-C', '0', '-g', '3', '-r', String(RATE_HZ)],
    ...['-O', 's16', '-T', 'raw', '-F', rawFile, SOUND_FONT, midiFile],
  ])
  return readFileSync(rawFile)
}

let totalBytes = 0
for (let midi = LOWEST_MIDI; midi <= HIGHEST_MIDI; midi += STEP_SEMITONES) {
  const channels = channelsOf(render(midi))
  const startOf = (channel) => channel.findIndex((sample) => Math.abs(sample) > 0.002)
  const loudness = channels.map((channel) => rms(channel, startOf(channel), startOf(channel) + RATE_HZ / 2))
  // One channel, the nearer microphone: summing the two would cancel partials that arrive out of phase.
  const nearer = loudness[0] >= loudness[1] ? 0 : 1
  const channel = channels[nearer]
  const start = Math.max(0, startOf(channel) - 20)
  const cents = centsOff(channel, start + Math.round(0.1 * RATE_HZ), midi)
  // High notes die sooner, so that as much sound in half a second would mean a harder blow: they are held back.
  const gain = (FIRST_HALF_SECOND_RMS / loudness[nearer]) * 2 ** (-Math.max(0, midi - 69) / 36)
  const seconds = ringSeconds(midi)
  const filters = [
    `pan=mono|c0=c${nearer}`,
    `atrim=start_sample=${start}`,
    'asetpts=PTS-STARTPTS',
    `asetrate=${Math.round(RATE_HZ * 2 ** (-cents / 1200))}`,
    `aresample=${RATE_HZ}:resampler=soxr`,
    `volume=${gain.toFixed(4)}`,
    `atrim=end=${seconds}`,
    `afade=t=out:st=${seconds * 0.6}:d=${seconds * 0.4}:curve=qsin`,
    'alimiter=limit=0.95:level=false',
  ]
  const input = ['-f', 's16le', '-ar', String(RATE_HZ), '-ac', '2', '-i', rawFile]
  execFileSync('ffmpeg', ['-v', 'error', '-y', ...input, '-af', filters.join(','), tuned])
  const file = join(HERE, `${nameOf(midi)}.mp3`)
  const encode = [
    '-ar',
    '32000',
    '-c:a',
    'libmp3lame',
    '-q:a',
    process.env.QUALITY ?? '5',
    '-map_metadata',
    '-1',
  ]
  execFileSync('ffmpeg', ['-v', 'error', '-y', '-i', tuned, ...encode, file])
  const { size } = statSync(file)
  totalBytes += size
  console.log(
    `${nameOf(midi).padEnd(4)} ${cents.toFixed(2).padStart(7)} cents put right, gain ${gain.toFixed(2)}, ${size} bytes`,
  )
}
rmSync(folder, { recursive: true })
console.log(`${totalBytes} bytes in all`)

import { WHOLE_TICKS } from '@/shared/theory/duration'
import { frequencyHertz, midiNumber } from '@/shared/theory/frequency'
import type { BarNotes } from '@/shared/theory/note'
import { parsePitch, type PitchName } from '@/shared/theory/pitch'
import {
  MAX_TEMPO,
  MIN_TEMPO,
  type BarSpan,
  type PlaybackRequest,
  type PlaybackScore,
  type SoundEvent,
  type Timeline,
} from './playback'

/** Quarter notes in the whole note that fills a bar. */
const QUARTERS_A_BAR = 4

/** A voice's notes over the bars heard, each with its place in ticks from the start of the hearing. */
type Placed = Readonly<{ bar: number; place: number; pitch: PitchName | null; ticks: number; tied: boolean }>

/**
 * Lays a score out in time. Bars set aside are left out and their neighbours follow each other; a tie across such a
 * gap, or out of the span, simply ends.
 * @example createTimeline({ cantus: ['D4', 'E4'], line: {}, setAside: [] },
 *   { voices: 'both', fromBar: 1, toBar: 2, tempo: 120 }).totalSeconds // 4
 */
export function createTimeline(score: PlaybackScore, request: PlaybackRequest): Timeline {
  const tempo = Math.min(MAX_TEMPO, Math.max(MIN_TEMPO, request.tempo))
  const barSeconds = (60 / tempo) * QUARTERS_A_BAR
  const bars = heardBars(score, request).map((bar, index): BarSpan => {
    return { bar, startSeconds: index * barSeconds, durationSeconds: barSeconds }
  })
  const secondsOf = (ticks: number): number => (ticks / WHOLE_TICKS) * barSeconds
  const voices = request.voices === 'both' ? (['cantus', 'line'] as const) : ([request.voices] as const)
  const events = voices.flatMap((voice) =>
    joinTies(placeNotes(bars, (bar) => notesOf(score, voice, bar))).flatMap((note): SoundEvent[] => {
      const parsed = note.pitch === null ? null : parsePitch(note.pitch)
      if (!parsed?.ok) return []
      return [
        {
          voice,
          bar: note.bar,
          startSeconds: secondsOf(note.place),
          durationSeconds: secondsOf(note.ticks),
          midi: midiNumber(parsed.value),
          hertz: frequencyHertz(parsed.value),
        },
      ]
    }),
  )
  return {
    events: events.sort((a, b) => a.startSeconds - b.startSeconds),
    bars,
    totalSeconds: bars.length * barSeconds,
  }
}

function heardBars(score: PlaybackScore, { fromBar, toBar }: PlaybackRequest): number[] {
  const isSetAside = new Set(score.setAside)
  return score.cantus
    .map((_, index) => index + 1)
    .filter((bar) => bar >= fromBar && bar <= toBar && !isSetAside.has(bar))
}

function notesOf(score: PlaybackScore, voice: 'cantus' | 'line', bar: number): BarNotes {
  if (voice === 'line') return score.line[bar] ?? []
  const pitch = score.cantus[bar - 1]
  return pitch === undefined ? [] : [{ pitch, ticks: WHOLE_TICKS }]
}

/** Notes past the end of their bar are cut at it. */
function placeNotes(bars: readonly BarSpan[], notesIn: (bar: number) => BarNotes): Placed[] {
  return bars.flatMap(({ bar }, index) => {
    let filled = 0
    return notesIn(bar).flatMap((note): Placed[] => {
      const ticks = Math.min(note.ticks, WHOLE_TICKS - filled)
      const place = index * WHOLE_TICKS + filled
      filled += ticks
      return ticks > 0 ? [{ bar, place, ticks, pitch: note.pitch, tied: note.tied === true }] : []
    })
  })
}

/** Makes one note of those tied together: the same pitch, with nothing between, in the same or the next bar of the score. */
function joinTies(notes: readonly Placed[]): Placed[] {
  const joined: Placed[] = []
  let lastBar = 0
  for (const note of notes) {
    const before = joined.at(-1)
    const isHeld =
      before?.tied === true &&
      before.pitch === note.pitch &&
      before.place + before.ticks === note.place &&
      note.bar - lastBar <= 1
    if (isHeld) joined[joined.length - 1] = { ...before, ticks: before.ticks + note.ticks, tied: note.tied }
    else joined.push(note)
    lastBar = note.bar
  }
  return joined
}

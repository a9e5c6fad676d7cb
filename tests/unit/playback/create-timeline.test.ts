import { createTimeline, positionAt, type PlaybackRequest, type PlaybackScore } from '@/shared/playback'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes } from '@/shared/theory/note'

const whole = (pitch: string): BarNotes => [{ pitch, ticks: WHOLE_TICKS }]
const score: PlaybackScore = {
  cantus: ['D4', 'F4', 'E4', 'D4'],
  line: { 1: whole('A4'), 2: whole('A4'), 4: whole('D5') },
  setAside: [],
}
const all: PlaybackRequest = { voices: 'both', fromBar: 1, toBar: 4, tempo: 120 }

const heard = (over: Partial<PlaybackRequest>, of: PlaybackScore = score) =>
  createTimeline(of, { ...all, ...over }).events.map(
    ({ voice, bar, startSeconds, durationSeconds, midi }) =>
      `${voice} ${bar} ${startSeconds}+${durationSeconds} ${midi}`,
  )

test('a whole note lasts four quarters of the tempo', () => {
  expect(heard({ voices: 'cantus' })).toEqual([
    'cantus 1 0+2 62',
    'cantus 2 2+2 65',
    'cantus 3 4+2 64',
    'cantus 4 6+2 62',
  ])
  expect(createTimeline(score, { ...all, tempo: 60 }).totalSeconds).toBe(16)
})

test.each([
  [{ tempo: 1 }, 48],
  [{ tempo: 9999 }, 4],
])('a tempo out of reach is brought within it: %p', (over, seconds) => {
  expect(createTimeline(score, { ...all, ...over }).totalSeconds).toBe(seconds)
})

test('an unwritten bar of the line is silent, and the cantus goes on under it', () => {
  expect(heard({ voices: 'line' })).toEqual(['line 1 0+2 69', 'line 2 2+2 69', 'line 4 6+2 74'])
  expect(heard({ fromBar: 3, toBar: 3 })).toEqual(['cantus 3 0+2 64'])
})

test('a repeated pitch is struck again, a tied one is held', () => {
  const tied = {
    ...score,
    line: { 1: [{ pitch: 'A4', ticks: WHOLE_TICKS, tied: true as const }], 2: whole('A4') },
  }
  expect(heard({ voices: 'line' }, tied)).toEqual(['line 1 0+4 69'])
  expect(heard({ voices: 'line', fromBar: 2 }, tied)).toEqual(['line 2 0+2 69'])
})

test('bars set aside are skipped without a gap, and no tie crosses them', () => {
  const line = { 1: [{ pitch: 'A4', ticks: WHOLE_TICKS, tied: true as const }], 3: whole('A4') }
  const reduction = { ...score, line, setAside: [2] }
  expect(heard({ voices: 'line' }, reduction)).toEqual(['line 1 0+2 69', 'line 3 2+2 69'])
  expect(createTimeline(reduction, all).bars.map(({ bar }) => bar)).toEqual([1, 3, 4])
})

test('shorter values stand where they fall in the bar, rests are silent, and what runs over the bar is cut', () => {
  const line = {
    1: [
      { pitch: null, ticks: WHOLE_TICKS / 2 },
      { pitch: 'A4', ticks: WHOLE_TICKS / 4 },
      { pitch: 'C#5', ticks: WHOLE_TICKS },
      { pitch: 'D5', ticks: WHOLE_TICKS },
    ],
  }
  expect(heard({ voices: 'line' }, { ...score, line })).toEqual(['line 1 1+0.5 69', 'line 1 1.5+0.5 73'])
})

test('a span beyond the score, or with everything set aside, is an empty hearing', () => {
  expect(createTimeline(score, { ...all, fromBar: 5, toBar: 9 })).toEqual({
    events: [],
    bars: [],
    totalSeconds: 0,
  })
  expect(createTimeline({ ...score, setAside: [1, 2, 3, 4] }, all).totalSeconds).toBe(0)
})

test('text that is no pitch is passed over in silence', () => {
  expect(heard({ voices: 'line' }, { ...score, line: { 1: whole('H4'), 2: whole('A4') } })).toEqual([
    'line 2 2+2 69',
  ])
})

test('the playhead goes bar by bar through what is heard', () => {
  const timeline = createTimeline({ ...score, setAside: [2] }, all)
  expect(positionAt(timeline, 0)).toEqual({ bar: 1, fraction: 0 })
  expect(positionAt(timeline, 3)).toEqual({ bar: 3, fraction: 0.5 })
  expect(positionAt(timeline, 5.5)).toEqual({ bar: 4, fraction: 0.75 })
  expect(positionAt(timeline, -0.01)).toBeNull()
  expect(positionAt(timeline, 6)).toBeNull()
  expect(positionAt(timeline, Number.NaN)).toBeNull()
})

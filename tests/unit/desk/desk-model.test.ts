import { barInHand, findingsAt, readDesk } from '@/components/desk/desk-model'
import { placeOnLadder, readRungs, wholeNote } from '@/components/desk/ladder-model'
import { ladderPitches } from '@/components/ladder/rungs'
import type { Judge } from '@/components/lesson/judge'
import { viewOf } from '@/components/lesson/lesson-view'
import { deskScoreOf } from '@/components/lesson/score-of'
import { speakScore } from '@/components/lesson/spoken'
import { lesson } from '@/components/words/en/lesson'
import { desk as deskWords } from '@/components/words/en/desk'
import type { Words } from '@/components/words'
import { createBoardState, INITIAL_STAGE, type BoardState, type SheetState } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import { formatPitch, pitchOf } from '@/shared/theory/pitch'
import type { BoardExercise } from '@/shared/wire/documents'

const words = { lesson, desk: deskWords } as Words

const EXERCISE: BoardExercise = {
  title: 'A second voice over the cantus in D',
  cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' '),
  mode: 'dorian',
  final: 'D',
  species: 1,
  position: 'above',
  clefs: { cantus: 'treble', line: 'treble' },
  signature: 0,
  ruleSet: { id: 'none', name: 'None', rules: {} },
}

const note = (pitch: string) => [...wholeNote(pitchOf(pitch))].map((one) => ({ ...one }))

const board = (over: Partial<BoardState> = {}): BoardState => {
  const start = createBoardState(EXERCISE, INITIAL_STAGE)
  const bars = { ...start.bars }
  for (const bar of [6, 7, 8]) bars[bar] = { state: 'released', setAside: false, round: 1 }
  bars[2] = { state: 'frozen', setAside: true, round: 1 }
  return { ...start, bars, line: { 5: note('B4'), 9: note('D5') }, ...over }
}
const sheet = (notes: Readonly<Record<number, string>>, round = 1): SheetState => ({
  notes: Object.fromEntries(
    Object.entries(notes).map(([bar, pitch]) => [bar, { notes: note(pitch), round }]),
  ),
  marks: [],
})

const risen: Finding = {
  ruleId: 'dir-perfect',
  code: 'similar-into-fifth',
  level: 'law',
  voice: 'line',
  bars: [6, 7],
  notes: [],
  args: {},
}
const judge: Judge = {
  ofLine: () => [],
  ofAll: () => undefined,
  ofNotes: (line) => (line[6]?.[0]?.pitch === 'C5' && line[7]?.[0]?.pitch === 'E5' ? [risen] : []),
}

describe('the desk', () => {
  const view = viewOf(board())

  test('own notes stand in open bars; a draft of a frozen bar does not', () => {
    const desk = readDesk(view, sheet({ 4: 'A4', 6: 'C5', 7: 'E5' }), judge)
    expect(Object.keys(desk.own)).toEqual(['6', '7'])
    expect(desk.bars[3]).toMatchObject({ kind: 'closed', adopted: null, draft: note('A4') })
    expect(desk.findings).toEqual([risen])
  })

  test('findings are not even computed into view while the teacher keeps them back', () => {
    const quiet = viewOf(board({ stage: { ...INITIAL_STAGE, showsFindings: false } }))
    expect(readDesk(quiet, sheet({ 6: 'C5', 7: 'E5' }), judge).findings).toBeNull()
  })

  test('the bar in hand is the one chosen, else the nearest open one', () => {
    const { bars } = readDesk(view, sheet({}), judge)
    expect(barInHand(bars, null)).toBe(6)
    expect(barInHand(bars, 10)).toBe(10)
    expect(barInHand(bars, 2)).toBe(6)
    expect(barInHand(bars, 40)).toBe(8)
    const shut = readDesk(
      viewOf(board({ bars: createBoardState(EXERCISE, INITIAL_STAGE).bars })),
      sheet({}),
      judge,
    )
    expect(barInHand(shut.bars, null)).toBe(1)
  })

  test('findings at a bar begin with those that end there', () => {
    const at8: Finding = { ...risen, bars: [7, 8] }
    expect(findingsAt([at8, risen], 7)).toEqual([risen, at8])
    expect(findingsAt([risen], 8)).toEqual([])
  })

  test('the score shows own notes as lozenges without a number, the breach where it was completed', () => {
    const own = { 6: note('C5'), 7: note('E5') }
    const score = deskScoreOf(view, own, [risen], 7)
    expect(score.bars[5]).toMatchObject({ figure: { text: '5', tone: 'cantus' }, motion: 'contrary' })
    expect(score.bars[5]?.proposals).toMatchObject([{ count: null, tone: 'line' }])
    expect(score.bars[6]).toMatchObject({ figure: { text: '5', tone: 'breach' }, motion: 'parallel' })
    expect(score.bars[6]?.proposals).toMatchObject([{ count: null, tone: 'breach' }])
    expect(score.bars[4]).toMatchObject({ line: note('B4'), proposals: [], state: 'frozen' })
    expect(score.bars[1]?.isSetAside).toBe(true)
    expect(score.arcs).toEqual([{ id: '6-7', fromBar: 6, toBar: 7, tone: 'breach' }])
  })
})

describe('the ladder of a bar', () => {
  const view = viewOf(board())
  const pitches = ladderPitches(view.exercise, false)
  const ladder = (written: Readonly<Record<number, string>>, bar: number, isTold = true) => {
    const own = Object.fromEntries(Object.entries(written).map(([at, pitch]) => [at, note(pitch)]))
    const elsewhere = Object.fromEntries(Object.entries(own).filter(([at]) => Number(at) !== bar))
    const rungs = readRungs({ view, elsewhere, bar, pitches, judge, naming: 'letters', isTold }, words)
    return { rungs, ...placeOnLadder(view, own, bar, pitches) }
  }
  const rungOf = (model: ReturnType<typeof ladder>, name: string) =>
    model.rungs[pitches.findIndex((pitch) => formatPitch(pitch) === name)]

  test('each rung names the interval and the motion into it', () => {
    const model = ladder({ 6: 'C5' }, 7)
    expect(rungOf(model, 'E5')).toMatchObject({ name: 'E', interval: 'fifth', motion: 'parallel' })
    expect(rungOf(model, 'C5')).toMatchObject({ interval: 'minor third', motion: 'oblique' })
    expect(rungOf(model, 'B4')).toMatchObject({ interval: 'major second', motion: 'contrary' })
    expect(rungOf(model, 'A4')).toMatchObject({ interval: 'unison' })
  })

  test('the chosen rung is the one written, and the ladder opens there', () => {
    const model = ladder({ 6: 'C5', 7: 'C5' }, 7)
    expect(model.chosen).toBe(pitches.findIndex((pitch) => formatPitch(pitch) === 'C5'))
    expect(model.home).toBe(model.chosen)
    expect(ladder({}, 7).chosen).toBeNull()
  })

  test('an empty bar opens near the note before it', () => {
    expect(formatPitch(pitches[ladder({}, 6).home] ?? pitchOf('C0'))).toBe('B4')
  })

  test('a screen reader is told all of it in a sentence, and findings only where they may be told', () => {
    expect(rungOf(ladder({ 6: 'C5' }, 7), 'C5')?.spoken).toBe(
      'bar 7, C, minor third above A, oblique motion; no finding.',
    )
    expect(rungOf(ladder({ 6: 'C5' }, 7, false), 'E5')).toMatchObject({
      mark: null,
      spoken: 'bar 7, E, fifth above A, parallel motion.',
    })
    expect(rungOf(ladder({}, 9), 'F4')?.spoken).toBe('bar 9, F, unison with F; no finding.')
  })
})

test('the score as text: a sentence a bar, bars set aside and unwritten ones too', () => {
  const view = viewOf(board())
  expect(
    speakScore(view, { 5: note('B4'), 6: note('A4') }, null, words)
      .slice(0, 6)
      .map(({ sentence }) => sentence),
  ).toEqual([
    'bar 1, cantus D, nothing written.',
    'bar 2, set aside.',
    'bar 3, cantus E, nothing written.',
    'bar 4, cantus D, nothing written.',
    'bar 5, B, major third above G.',
    'bar 6, A, major third above F, parallel motion.',
  ])
})

test('a desk keeps its arcs on one level: the bar in hand first, then breaches', () => {
  const view = viewOf(board())
  const of = (bars: readonly number[], level: Finding['level']): Finding => ({ ...risen, bars, level })
  const findings = [
    of([5, 6, 7, 8, 9], 'preference'),
    of([5, 6], 'preference'),
    risen,
    of([7, 8], 'law'),
    of([8, 9], 'law'),
  ]
  const arcs = (hand: number) =>
    deskScoreOf(view, {}, findings, hand).arcs.map(({ fromBar, toBar }) => [fromBar, toBar])
  expect(arcs(7)).toEqual([
    [6, 7],
    [7, 8],
    [8, 9],
    [5, 6],
  ])
  expect(arcs(5)).toEqual([[5, 9]])
})

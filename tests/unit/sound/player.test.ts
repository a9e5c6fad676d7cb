import type { PlayRequest } from '@/components/sound/player'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { createStage, type FakeStage } from './fake-audio'

const request: PlayRequest = {
  id: 'line',
  score: { cantus: ['D4', 'E4', 'D4'], line: { 1: [{ pitch: 'A4', ticks: WHOLE_TICKS }] }, setAside: [] },
  voices: 'both',
  fromBar: 1,
  toBar: 3,
  tempo: 120,
}

/** Lets every promise that is ready settle. */
const settle = () => new Promise((resolve) => setImmediate(resolve))

async function playing(over: Partial<PlayRequest> = {}): Promise<FakeStage> {
  const stage = createStage()
  stage.player.play({ ...request, ...over })
  await settle()
  stage.loads[0]?.succeed()
  await settle()
  return stage
}

test('nothing is fetched and nothing sounds until it is asked for', () => {
  const { loads, scheduled, player } = createStage()
  expect(loads).toEqual([])
  expect(scheduled).toEqual([])
  expect(player.getState()).toEqual({ status: 'idle', id: null, bar: null, problem: null })
})

test('only the notes that will be heard are fetched', () => {
  const { player, loads } = createStage()
  player.play({ ...request, voices: 'line' })
  expect(loads.map(({ midis }) => midis)).toEqual([[69]])
})

test('it says whose hearing is loading, and then playing', async () => {
  const stage = createStage()
  stage.player.play(request)
  expect(stage.player.getState()).toMatchObject({ status: 'loading', id: 'line' })
  await settle()
  stage.loads[0]?.succeed()
  await settle()
  expect(stage.player.getState()).toMatchObject({ status: 'playing', id: 'line', problem: null })
  expect(stage.scheduled).toHaveLength(4)
})

test('the playhead follows the audio clock, within the bar and bar by bar', async () => {
  const stage = await playing()
  const start = stage.scheduled[0]?.startSeconds as number
  stage.advanceTo(start + 1)
  expect(stage.player.getPlayhead()).toEqual({ bar: 1, fraction: expect.closeTo(0.5) })
  stage.advanceTo(start + 2.5)
  expect(stage.player.getState().bar).toBe(2)
  stage.advanceTo(start + 4.5)
  expect(stage.player.getPlayhead()).toEqual({ bar: 3, fraction: expect.closeTo(0.25) })
})

test('the state is told once a bar, the playhead at every frame', async () => {
  const stage = await playing()
  const told = { state: 0, playhead: 0 }
  stage.player.subscribe(() => (told.state += 1))
  stage.player.subscribePlayhead(() => (told.playhead += 1))
  const start = stage.scheduled[0]?.startSeconds as number
  for (const seconds of [0.1, 0.2, 0.3, 1.9, 2.1]) stage.advanceTo(start + seconds)
  expect(told).toEqual({ state: 2, playhead: 5 })
})

test('stop fades everything out at once, and no frame is asked for again', async () => {
  const stage = await playing()
  stage.advanceTo(1)
  stage.player.stop()
  expect(stage.scheduled.every(({ stopSeconds }) => stopSeconds <= 1.03)).toBe(true)
  expect(stage.frames.size).toBe(0)
  expect(stage.delays.size).toBe(0)
  expect(stage.player.getState().status).toBe('idle')
  expect(stage.player.getPlayhead()).toBeNull()
})

test('the last note dying ends the hearing', async () => {
  const stage = await playing()
  stage.scheduled.findLast(({ onended }) => onended)?.onended?.()
  for (const { onended } of stage.scheduled) onended?.()
  expect(stage.player.getState()).toEqual({ status: 'idle', id: null, bar: null, problem: null })
})

test('two quick requests never overlap: the first, still loading, is never struck', async () => {
  const stage = createStage()
  stage.player.play(request)
  stage.player.play({ ...request, id: 'other', voices: 'cantus' })
  await settle()
  for (const load of stage.loads) load.succeed()
  await settle()
  expect(stage.player.getState()).toMatchObject({ status: 'playing', id: 'other' })
  expect(stage.scheduled).toHaveLength(3)
})

test('a second request while one sounds ends the first before it begins', async () => {
  const stage = await playing()
  stage.advanceTo(1)
  const first = [...stage.scheduled]
  stage.player.play({ ...request, id: 'other' })
  await settle()
  stage.loads[1]?.succeed()
  await settle()
  const second = stage.scheduled.slice(first.length)
  const lastOfFirst = Math.max(...first.map(({ stopSeconds }) => stopSeconds))
  expect(lastOfFirst).toBeLessThan(Math.min(...second.map(({ startSeconds }) => startSeconds)))
})

test('stopped while loading, it stays silent when the recordings arrive', async () => {
  const stage = createStage()
  stage.player.play(request)
  await settle()
  stage.player.stop()
  stage.loads[0]?.succeed()
  await settle()
  expect(stage.scheduled).toEqual([])
  expect(stage.player.getState().status).toBe('idle')
})

describe('what goes wrong is said, and the next request starts afresh', () => {
  test('a browser without sound', async () => {
    const stage = createStage()
    stage.stage.hasAudio = false
    stage.player.play(request)
    expect(stage.player.getState()).toMatchObject({ status: 'idle', problem: 'no-audio' })
  })

  test('a page that has not been touched', async () => {
    const stage = createStage()
    stage.stage.isAwake = false
    stage.player.play(request)
    await settle()
    expect(stage.player.getState()).toMatchObject({ status: 'idle', problem: 'asleep' })
    stage.loads[0]?.succeed()
    await settle()
    expect(stage.scheduled).toEqual([])
  })

  test('recordings that cannot be fetched', async () => {
    const stage = createStage()
    stage.player.play(request)
    await settle()
    stage.loads[0]?.fail()
    await settle()
    expect(stage.player.getState()).toMatchObject({ status: 'idle', problem: 'not-loaded' })
    stage.player.play(request)
    expect(stage.player.getState()).toMatchObject({ status: 'loading', problem: null })
  })

  test('an audio clock that stands still', async () => {
    const stage = await playing()
    stage.passWallClock()
    expect(stage.player.getState()).toMatchObject({ status: 'idle', problem: 'no-device' })
  })

  test('a clock that moves is left alone', async () => {
    const stage = await playing()
    stage.advanceTo(1.4)
    stage.passWallClock()
    expect(stage.player.getState()).toMatchObject({ status: 'playing', problem: null })
  })

  test('sound taken away in the middle', async () => {
    const stage = await playing()
    stage.setContextState('suspended')
    expect(stage.player.getState()).toMatchObject({ status: 'idle', problem: 'asleep' })
  })

  test('nothing written where it was asked to begin', () => {
    const stage = createStage()
    stage.player.play({ ...request, voices: 'line', fromBar: 2 })
    expect(stage.player.getState()).toMatchObject({ status: 'idle', problem: 'nothing' })
    expect(stage.loads).toEqual([])
  })
})

test('a single note is struck without a playhead, and nothing says that it plays', async () => {
  const stage = createStage()
  stage.player.strike('C#5')
  await settle()
  stage.loads[0]?.succeed()
  await settle()
  stage.advanceTo(0.5)
  expect(stage.loads[0]?.midis).toEqual([73])
  expect(stage.scheduled).toHaveLength(1)
  expect(stage.player.getPlayhead()).toBeNull()
  expect(stage.player.getState().status).toBe('idle')
  stage.player.play(request)
  expect(stage.scheduled[0]?.stopSeconds).toBeLessThan(0.6)
})

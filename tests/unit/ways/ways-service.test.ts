import { formatCount, formatWays } from '@/components/ways/format-ways'
import type { WaysReply, WaysRequest } from '@/components/ways/ways-messages'
import { createWaysService } from '@/components/ways/ways-service'
import { findPreset } from '@/shared/rules'
import { createCore1 } from '@/shared/rules/presets/core-1'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line } from '@/shared/theory/note'

const DORIAN = 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' ')
const CORE = createCore1({ lowest: 'D4', highest: 'D6' })

const line = (notes: Readonly<Record<number, string>>): Line =>
  Object.fromEntries(Object.entries(notes).map(([bar, pitch]) => [bar, [{ pitch, ticks: WHOLE_TICKS }]]))

const request = (number: number, more: Partial<WaysRequest> = {}): WaysRequest => ({
  number,
  exercise: { cantus: DORIAN, mode: 'dorian', final: 'D', species: 1, position: 'above' },
  ruleSet: CORE,
  setAside: [],
  questions: [{ key: 'whole', line: {} }],
  ...more,
})

/** A service whose slices run when the test says so. */
function createSlow() {
  const replies: WaysReply[] = []
  const slices: (() => void)[] = []
  const service = createWaysService(
    (reply) => replies.push(reply),
    (slice) => slices.push(slice),
  )
  const run = (most = Infinity) => {
    for (let done = 0; done < most && slices.length > 0; done += 1) (slices.shift() as () => void)()
  }
  return { service, replies, slices, run }
}

describe('ways to finish, asked from a screen', () => {
  test('the Dorian cantus has the 118 ways that the definition of core-1 gives', () => {
    const { service, replies, run } = createSlow()
    service.ask(request(1))
    run()
    expect(replies).toEqual([
      { number: 1, key: 'whole', answer: { count: '118', isExact: true, deadEnd: null, alive: null } },
    ])
  })

  test('the notes alive in a bar share out all the ways', () => {
    const { service, replies, run } = createSlow()
    service.ask(request(1, { questions: [{ key: 'bar', line: {}, aliveInBar: 6 }] }))
    run()
    const alive = replies[0]?.answer.alive ?? {}
    expect(Object.values(alive).reduce((sum, count) => sum + Number(count), 0)).toBe(118)
  })

  test('a line that cannot be finished names the bar and the laws', () => {
    const { service, replies, run } = createSlow()
    // A tritone over F in bar 2, which no law of two voices lets stand.
    service.ask(request(1, { questions: [{ key: 'stuck', line: line({ 2: 'B4' }) }] }))
    run()
    expect(replies[0]?.answer).toMatchObject({ count: '0', deadEnd: { bar: 2, because: 'laws' } })
    expect(replies[0]?.answer.deadEnd?.rules.length).toBeGreaterThan(0)
  })

  test('a newer request puts aside the one at work, and is answered itself', () => {
    const { service, replies, run } = createSlow()
    const many = Array.from({ length: 20 }, (_, index) => ({ key: String(index), line: {} }))
    service.ask(request(1, { ruleSet: findPreset('starter') ?? CORE, questions: many }))
    run(3)
    service.ask(request(2))
    run()
    expect(replies.filter(({ number }) => number === 1).length).toBeLessThan(many.length)
    expect(replies.filter(({ number }) => number === 2).map(({ answer }) => answer.count)).toEqual(['118'])
  })

  test('bars set aside are finished as if they were not there', () => {
    const { service, replies, run } = createSlow()
    service.ask(request(1, { setAside: [2, 3], questions: [{ key: 'a', line: {}, aliveInBar: 2 }] }))
    run()
    expect(replies[0]?.answer.alive).toEqual({})
    expect(replies[0]?.answer.count).not.toBe('118')
  })
})

describe('a count for reading', () => {
  test.each([
    ['0', '0'],
    ['1284', '1,284'],
    ['123456789', '123,456,789'],
    ['3170000000000', '3.17T'],
    ['7534000000000000000', '7.53 × 10¹⁸'],
  ])('%s is written %s', (count, written) => {
    expect(formatCount(count)).toBe(written)
  })

  test('one that was cut short says so', () => {
    expect(formatWays({ count: '600000', isExact: false, deadEnd: null, alive: null })).toBe('600,000+')
  })
})

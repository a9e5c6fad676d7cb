/** The search under `core-1`, against the definition enumerated note by note without any of the engine. */
import { createHash } from 'node:crypto'
import { createCore1 } from '@/shared/rules'
import { createSearch } from '@/shared/search'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'
import { enumerate, violations, type Case } from '../rules/core-1-reference'
import { exerciseOf, spell } from './cases'

const CASES: readonly Case[] = FUX_CANTI.flatMap(({ notes, mode, final }) => {
  const cantus = notes.split(' ')
  const [low] = [...cantus].sort((a, b) => Number(a.at(-1)) - Number(b.at(-1)))
  const isLow = low?.endsWith('3')
  return [
    { cantus, mode, final, position: 'above' as const, lo: isLow ? 'G3' : 'D4', hi: isLow ? 'G5' : 'D6' },
    { cantus, mode, final, position: 'below' as const, lo: isLow ? 'D2' : 'A2', hi: isLow ? 'D4' : 'A4' },
  ]
})

function searchFor({ cantus, mode, final, position, lo, hi }: Case) {
  const exercise = exerciseOf(cantus.join(' '), mode, final, position)
  return createSearch(exercise, createCore1({ lowest: lo, highest: hi }))
}

test.each([
  { position: 'above', lo: 'D4', hi: 'D6', count: 118n },
  { position: 'below', lo: 'A2', hi: 'A4', count: 55n },
] as const)('finds the known $count solutions $position', ({ position, lo, hi, count }) => {
  const { notes, mode, final } = FUX_CANTI[0] as (typeof FUX_CANTI)[number]
  expect(searchFor({ cantus: notes.split(' '), mode, final, position, lo, hi }).find().count).toBe(count)
})

describe.each(CASES)('$mode $position, $lo to $hi', (k) => {
  const expected: string[] = []
  const alive = new Map<string, number>()
  enumerate(k, (x) => {
    if (violations(k, x).length > 0) return
    expected.push(x.map(({ name }) => name).join(' '))
    for (const [index, { name }] of x.entries()) {
      const at = `${index + 1} ${name}`
      alive.set(at, (alive.get(at) ?? 0) + 1)
    }
  })
  const ways = searchFor(k).find()

  test('the same solutions in the same order', () => {
    const digest = createHash('sha256')
    let count = 0
    for (const line of ways.solutions()) {
      digest.update(`${spell(line)}\n`)
      count += 1
    }
    expect(ways.count).toBe(BigInt(expected.length))
    expect(count).toBe(expected.length)
    const known = createHash('sha256').update(expected.map((line) => `${line}\n`).join(''))
    expect(digest.digest('hex')).toBe(known.digest('hex'))
  })

  test('the same alive notes with the same counts', () => {
    const found = new Map(
      ways
        .alive()
        .flatMap(({ bar, notes }) =>
          notes.map(({ pitch, count }) => [`${bar} ${pitch}`, Number(count)] as const),
        ),
    )
    expect([...found].sort()).toEqual([...alive].sort())
  })
})

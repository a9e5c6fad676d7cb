/** The search under `core-2`: the known count, and an answer-set solver's counts and alive notes over short canti. */
import { createCore2 } from '@/shared/rules/presets/core-2'
import { createSearch } from '@/shared/search'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'
import { CLINGO_MISSING, hasClingo, runClingo } from '@/tests/support/clingo'
import { exerciseOf } from './cases'

test('finds the known 51,164 solutions above', () => {
  const { notes, mode, final } = FUX_CANTI[0] as (typeof FUX_CANTI)[number]
  const ruleSet = createCore2({ lowest: 'D4', highest: 'D6' })
  expect(createSearch(exerciseOf(notes, mode, final, 'above', 2), ruleSet).find().count).toBe(51_164n)
})

const SHORT = [
  { cantus: 'D4 F4 E4 G4 F4 E4 D4', mode: 'dorian', final: 'D' },
  { cantus: 'E4 G4 F4 A4 G4 F4 E4', mode: 'phrygian', final: 'E' },
  { cantus: 'C4 E4 F4 D4 E4 D4 C4', mode: 'ionian', final: 'C' },
  { cantus: 'A3 C4 B3 D4 C4 B3 A3', mode: 'aeolian', final: 'A' },
] as const

const isThere = hasClingo()
if (!isThere) console.warn(CLINGO_MISSING)
const describeHere = isThere ? describe : describe.skip

describeHere('counts and alive notes as the answer-set program has them', () => {
  test.each(
    SHORT.flatMap((short) => [
      { ...short, position: 'above' as const, lo: 'C4', hi: 'C6' },
      { ...short, position: 'below' as const, lo: 'F2', hi: 'G4' },
    ]),
  )('$cantus $position', ({ cantus, mode, final, position, lo, hi }) => {
    const { count, models } = runClingo('core-2', {
      cantus: cantus.split(' '),
      mode,
      final,
      position,
      lo,
      hi,
    })
    const ruleSet = createCore2({ lowest: lo, highest: hi })
    const ways = createSearch(exerciseOf(cantus, mode, final, position, 2), ruleSet).find()
    expect(ways.count).toBe(BigInt(count))
    const sounding = new Map<string, number>()
    for (const atoms of models) {
      for (const atom of atoms) {
        const slot = Number(/^x\((\d+)/.exec(atom)?.[1] ?? 0)
        if (slot > 0) sounding.set(atom, (sounding.get(atom) ?? 0) + 1)
      }
    }
    const alive = ways
      .alive()
      .flatMap(({ bar, place, notes }) =>
        notes
          .filter(({ pitch }) => pitch !== null)
          .map((note) => ({ slot: 2 * bar - 1 + (place > 0 ? 1 : 0), ...note })),
      )
    const bySlot = (counts: Iterable<readonly [number, number]>) => {
      const sums = new Map<number, number[]>()
      for (const [slot, times] of counts)
        sums.set(
          slot,
          [...(sums.get(slot) ?? []), times].sort((a, b) => a - b),
        )
      return sums
    }
    const merged = new Map<string, number>()
    for (const { slot, pitch, count: times } of alive) {
      const at = `${slot} ${pitch}`
      merged.set(at, (merged.get(at) ?? 0) + Number(times))
    }
    expect(bySlot([...merged].map(([at, times]) => [Number(at.split(' ')[0]), times] as const))).toEqual(
      bySlot([...sounding].map(([atom, times]) => [Number(/\d+/.exec(atom)?.[0]), times] as const)),
    )
  })
})

/**
 * Counts the solutions of `core-1` the way a search will: lines whose rules stand in states of equal keys are one. That
 * the counts come out shows that no two states share a key which do not share their future.
 */
import { createCore1 } from '@/shared/rules/presets/core-1'
import { readMoments, readVoice } from '@/shared/rules/reading'
import { resolveRuleSet } from '@/shared/rules/rule-set'
import type { Exercise, Moment, Step } from '@/shared/rules/rule'
import type { PitchName } from '@/shared/theory/pitch'
import { pitchClassOf, pitchOf } from '@/shared/theory/pitch'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'
import { pool, pool7, type Case } from './core-1-reference'
import { whole } from './random-score'

type Node = Readonly<{ states: readonly unknown[]; count: number }>

function countByKeys(k: Case): Readonly<{ count: number; widest: number }> {
  const exercise: Exercise = {
    cantus: k.cantus.map(pitchOf),
    mode: k.mode,
    final: pitchClassOf(k.final),
    species: 1,
    position: k.position,
  }
  const { active } = resolveRuleSet(createCore1({ lowest: k.lo, highest: k.hi }))
  const names: readonly PitchName[] = [...pool(k), ...pool7(k)].map(({ name }) => name)
  const bars = k.cantus.length
  const start = active.map(({ rule, params }): unknown => rule.start(exercise, params, 'line'))
  let layer = new Map<string, Node>([['', { states: start, count: 1 }]])
  let widest = 1
  for (let bar = 1; bar <= bars; bar += 1) {
    const next = new Map<string, Node>()
    for (const name of names) {
      const line = { [bar]: whole(name) }
      const pair = readMoments(exercise, line)[bar - 1] as Moment
      const solo = readVoice(bars, line)[bar - 1] as Moment
      for (const { states, count } of layer.values()) {
        const reached = stepAll(states, pair, solo)
        if (reached === null) continue
        const key = reached.map((state, index) => active[index]?.rule.key(state)).join()
        next.set(key, { states: reached, count: count + (next.get(key)?.count ?? 0) })
      }
    }
    layer = next
    widest = Math.max(widest, layer.size)
  }
  const complete = [...layer.values()].filter(({ states }) =>
    active.every(({ rule, params }, index) => rule.finish(states[index], params, true) === null),
  )
  return { count: complete.reduce((sum, { count }) => sum + count, 0), widest }

  /** The states after a note, or `null` where some rule has something against it. */
  function stepAll(states: readonly unknown[], pair: Moment, solo: Moment): readonly unknown[] | null {
    const reached: unknown[] = []
    for (const [index, { rule, params }] of active.entries()) {
      const moment = rule.scope === 'pair' ? pair : solo
      const { state, breach } = rule.step(states[index], moment, params) as Step<unknown>
      if (breach !== null && !breach.isRemark) return null
      reached.push(state)
    }
    return reached
  }
}

test.each([
  { position: 'above', lo: 'D4', hi: 'D6', count: 118 },
  { position: 'below', lo: 'A2', hi: 'A4', count: 55 },
] as const)('counted by keys there are $count solutions $position', ({ position, lo, hi, count }) => {
  const { notes, mode, final } = FUX_CANTI[0] as (typeof FUX_CANTI)[number]
  const counted = countByKeys({ cantus: notes.split(' '), mode, final, position, lo, hi })
  expect(counted.count).toBe(count)
  // Merging is worth its while: far fewer states than lines that break nothing on their way.
  expect(counted.widest).toBeLessThan(1_000)
})

import type { SetAside } from '@/shared/rules/reading'
import { stepsFrom } from '@/shared/theory/interval'
import { comparePitches, type Pitch } from '@/shared/theory/pitch'

/** What remains of a melody when bars are set aside. */
export type Reduction = Readonly<{
  /** Bars that remain, 1-based. */
  kept: readonly number[]
  setAside: readonly number[]
  pitches: readonly Pitch[]
  /** True when nothing that remains moves by more than a step. */
  isStepwise: boolean
}>

/** The melody without some of its bars. */
export function reduceCantus(cantus: readonly Pitch[], setAside: SetAside): Reduction {
  const bars = cantus.map((_, index) => index + 1)
  const kept = bars.filter((bar) => !setAside.has(bar))
  const pitches = kept.map((bar) => cantus[bar - 1] as Pitch)
  return {
    kept,
    setAside: bars.filter((bar) => setAside.has(bar)),
    pitches,
    isStepwise: pitches.every(
      (pitch, index) => index === 0 || isStepOrStay(pitches[index - 1] as Pitch, pitch),
    ),
  }
}

const isStepOrStay = (a: Pitch, b: Pitch): boolean => Math.abs(stepsFrom(a, b)) <= 1

/**
 * The stepwise skeleton: the fewest bars to set aside so that what remains goes from the first note to the last by
 * step. Of several, one that keeps the apex is taken, then the one that keeps the earlier bars. `null` where no walk by
 * step leads to the last note. Fux's Dorian cantus, D F E D G F A G F E D, keeps D (bar 1), E, F, G, F, E, D. Common
 * practice, no source.
 */
export function proposeSkeleton(cantus: readonly Pitch[]): Reduction | null {
  const last = cantus.length - 1
  if (last < 0) return null
  const highest = cantus.reduce((a, b) => (comparePitches(b, a) > 0 ? b : a))
  // From each bar: how many bars a walk to the end keeps, and whether it meets the apex; best of what may follow.
  const walks = new Array<Walk | null>(cantus.length).fill(null)
  for (let index = last; index >= 0; index -= 1) {
    const pitch = cantus[index] as Pitch
    const hasApex = comparePitches(pitch, highest) === 0
    if (index === last) {
      walks[index] = { length: 1, hasApex, next: null }
      continue
    }
    for (let next = index + 1; next <= last; next += 1) {
      const on = walks[next]
      if (!on || Math.abs(stepsFrom(pitch, cantus[next] as Pitch)) !== 1) continue
      const walk: Walk = { length: on.length + 1, hasApex: hasApex || on.hasApex, next }
      if (isBetter(walk, walks[index] ?? null)) walks[index] = walk
    }
  }
  if (walks[0] === null) return null
  const kept = new Set<number>()
  for (let index: number | null = 0; index !== null; index = walks[index]?.next ?? null) kept.add(index + 1)
  return reduceCantus(cantus, new Set(cantus.map((_, index) => index + 1).filter((bar) => !kept.has(bar))))
}

type Walk = Readonly<{ length: number; hasApex: boolean; next: number | null }>

const isBetter = (walk: Walk, than: Walk | null): boolean =>
  than === null || walk.length > than.length || (walk.length === than.length && walk.hasApex && !than.hasApex)

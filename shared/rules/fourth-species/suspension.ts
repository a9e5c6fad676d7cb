import { z } from 'zod'
import { isAboveCantus } from '@/shared/rules/fourth-species/folds'
import type { Sonority } from '@/shared/rules/first-species/sonority'

/** Suspensions over the cantus, by the interval held and the one it falls to. 9–8 has its octaves, 2–1 has none. */
export const SUSPENSIONS_ABOVE = ['7-6', '4-3', '9-8', '2-1', '5-4'] as const
/** Suspensions under the cantus. 2–3 stands for 9–10, 5–6 for a diminished fifth. */
export const SUSPENSIONS_BELOW = ['2-3', '4-5', '5-6', '7-8'] as const
export type SuspensionAbove = (typeof SUSPENSIONS_ABOVE)[number]
export type SuspensionBelow = (typeof SUSPENSIONS_BELOW)[number]
export type Suspension = SuspensionAbove | SuspensionBelow

const ABOVE: Readonly<Record<number, SuspensionAbove>> = { 3: '4-3', 4: '5-4', 6: '7-6' }
const BELOW: Readonly<Record<number, SuspensionBelow>> = { 1: '2-3', 3: '4-5', 4: '5-6', 6: '7-8' }

/** Which suspension a held dissonance makes; `null` for a chromatic third or sixth, which has no name as one. */
export function suspensionAbove({ steps, simpleSteps }: Sonority): SuspensionAbove | null {
  if (simpleSteps === 1) return steps === 1 ? '2-1' : '9-8'
  return ABOVE[simpleSteps] ?? null
}

export const suspensionBelow = ({ simpleSteps }: Sonority): SuspensionBelow | null =>
  BELOW[simpleSteps] ?? null

export const suspensionOf = (now: Sonority): Suspension | null =>
  isAboveCantus(now) ? suspensionAbove(now) : suspensionBelow(now)

export const suspensionList = <Name extends Suspension>(
  names: readonly [Name, ...Name[]],
  fallback: readonly Name[],
  description: string,
) =>
  z
    .array(z.enum(names))
    .default([...fallback] as never)
    .describe(description)

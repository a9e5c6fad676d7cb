import { downbeatsOf, readStretches, type Sonority } from '@/shared/analysis/sonorities'
import type { SetAside } from '@/shared/rules/reading'
import type { Exercise } from '@/shared/rules/rule'
import { motionBetween } from '@/shared/theory/motion'
import type { Line } from '@/shared/theory/note'

/** Voices that move together in thirds or in sixths, from and to included. */
export type ParallelRun = Readonly<{
  fromBar: number
  toBar: number
  /** Tenths count as thirds, thirteenths as sixths, but a run does not change from one to the other. */
  interval: 'thirds' | 'sixths'
  /** Sonorities in the run, two at least. */
  length: number
}>

const KINDS: Readonly<Record<number, ParallelRun['interval']>> = { 2: 'thirds', 5: 'sixths' }

/** Runs of parallel imperfect consonances on the downbeats, each as long as it lasts. */
export function findParallelRuns(
  exercise: Exercise,
  line: Line,
  setAside?: SetAside,
): readonly ParallelRun[] {
  return readStretches(exercise, line, setAside).flatMap((stretch) => runsOf(downbeatsOf(stretch)))
}

function runsOf(downbeats: readonly Sonority[]): readonly ParallelRun[] {
  const runs: ParallelRun[] = []
  let start = 0
  for (let index = 1; index <= downbeats.length; index += 1) {
    if (index < downbeats.length && goesOn(downbeats[index - 1] as Sonority, downbeats[index] as Sonority))
      continue
    const first = downbeats[start] as Sonority
    const last = downbeats[index - 1] as Sonority
    const interval = KINDS[first.simpleSteps]
    const length = index - start
    if (interval !== undefined && length >= 2)
      runs.push({ fromBar: first.bar, toBar: last.bar, interval, length })
    start = index
  }
  return runs
}

const goesOn = (before: Sonority, now: Sonority): boolean =>
  before.simpleSteps in KINDS &&
  motionBetween(before.cantus, now.cantus, before.line, now.line) === 'parallel'

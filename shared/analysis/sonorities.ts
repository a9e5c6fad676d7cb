import type { Moment } from '@/shared/rules/rule'
import { readMoments, type SetAside } from '@/shared/rules/reading'
import type { Exercise } from '@/shared/rules/rule'
import type { Line } from '@/shared/theory/note'
import type { Pitch } from '@/shared/theory/pitch'

/** Both voices sounding together, where and how. */
export type Sonority = Readonly<{
  bar: number
  /** Ticks from the start of the bar. */
  place: number
  cantus: Pitch
  line: Pitch
  /** False when the line holds its note over from before. */
  isStruck: boolean
  /** Letters between the voices without the octaves, whichever is the higher: 2 for a third or a tenth. */
  simpleSteps: number
}>

/**
 * Reads a score into stretches of sonorities with nothing unwritten and no rest between them. Bars set aside are not
 * read, and make no break.
 */
export function readStretches(
  exercise: Exercise,
  line: Line,
  setAside?: SetAside,
): readonly (readonly Sonority[])[] {
  const stretches: Sonority[][] = [[]]
  for (const moment of readMoments(exercise, line, setAside)) {
    const sonority = sonorityOf(moment)
    if (sonority) stretches.at(-1)?.push(sonority)
    else if (stretches.at(-1)?.length !== 0) stretches.push([])
  }
  return stretches.filter(({ length }) => length > 0)
}

function sonorityOf({ bar, place, note, other, isStruck, simpleSteps }: Moment): Sonority | null {
  if (note === null || note === 'rest' || other === null) return null
  return { bar, place, cantus: other, line: note, isStruck, simpleSteps }
}

/** The first sonority of each bar of a stretch: what the downbeats alone say. */
export const downbeatsOf = (stretch: readonly Sonority[]): readonly Sonority[] =>
  stretch.filter(({ bar }, index) => bar !== stretch[index - 1]?.bar)

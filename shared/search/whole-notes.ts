import { momentOf } from '@/shared/rules/reading'
import type { Exercise } from '@/shared/rules/rule'
import type { Choice, Place, Places } from '@/shared/search/place'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { formatPitch, type Pitch } from '@/shared/theory/pitch'

/** The places of first species: one whole note against each bar that is read. */
export function placesOfWholeNotes(
  { cantus }: Exercise,
  bars: readonly number[],
  pitchesAt: (bar: number) => readonly Pitch[],
): Places {
  const last = bars.length - 1
  const places = bars.map((bar, index): Place => {
    const other = cantus[bar - 1] as Pitch
    const choices = pitchesAt(bar).map((note): Choice => {
      const onset = { bar, place: 0, note, isHeld: false }
      const isNextToLast = index === last - 1
      return {
        onsets: [{ bar, place: 0, pitch: formatPitch(note), ticks: WHOLE_TICKS, isTied: false }],
        solo: momentOf(onset, null, WHOLE_TICKS, index, isNextToLast, index === last),
        pair: [momentOf(onset, other, WHOLE_TICKS, index, isNextToLast, index === last)],
        next: index + 1,
      }
    })
    return { bar, place: 0, choices }
  })
  return [...places, { bar: (bars.at(-1) ?? 0) + 1, place: 0, choices: [] }]
}

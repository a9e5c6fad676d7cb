import { signatureAlteration } from '@/shared/notation/key-signature'
import type { BarLayout, ScoreLayout, StaffLayout, SystemLayout } from '@/shared/notation/score-layout'
import { pitchAtPlace, TOP_LINE_PLACE } from '@/shared/notation/staff-place'
import { formatPitch, HIGHEST_OCTAVE, LOWEST_OCTAVE, type PitchName } from '@/shared/theory/pitch'

export type BarHit = Readonly<{ system: SystemLayout; bar: BarLayout }>

/** The bar under a point of the score, its head and the room under it included; null over clefs and beside the music. */
export function barAt(layout: ScoreLayout, x: number, y: number): BarHit | null {
  for (const system of layout.systems) {
    if (y < system.yPx || y >= system.yPx + system.heightPx) continue
    const bar = system.bars.find(({ xPx, widthPx }) => {
      const left = system.xPx + xPx
      return x >= left && x < left + widthPx
    })
    if (bar) return { system, bar }
  }
  return null
}

/** A place of the staff that was pointed at, and where a lozenge there has its centre. */
export type StaffHit = Readonly<{ bar: number; pitch: PitchName; xPx: number; yPx: number }>

/** Ledger lines a click may reach on either side. */
const REACH_PLACES = 7

const staffOf = (layout: ScoreLayout, system: SystemLayout): StaffLayout | undefined =>
  system.staves.find(({ voice }) => voice === layout.pressedVoice)

/**
 * The pitch a point of the score stands for, on the staff that is being written; the signature colours it, and a click
 * cannot ask for another accidental. Null in a folded bar, nearer to the other staff, or too far from any.
 */
export function staffPitchAt(layout: ScoreLayout, x: number, y: number): StaffHit | null {
  const hit = barAt(layout, x, y)
  if (!hit || hit.bar.isFolded) return null
  const { system, bar } = hit
  const staff = staffOf(layout, system)
  if (!staff) return null
  const top = system.yPx + staff.topPx
  const place = Math.round(TOP_LINE_PLACE - (2 * (y - top)) / layout.spacePx)
  if (place < -REACH_PLACES || place > TOP_LINE_PLACE + REACH_PLACES) return null
  const rail = system.railPx === null ? null : system.yPx + system.railPx
  const isUpper = staff === system.staves[0]
  if (rail !== null && (isUpper ? y > rail : y < rail)) return null
  const { letter, octave } = pitchAtPlace(place, staff.clef)
  if (octave < LOWEST_OCTAVE || octave > HIGHEST_OCTAVE) return null
  return {
    bar: bar.number,
    pitch: formatPitch({ letter, octave, alteration: signatureAlteration(layout.signature, letter) }),
    xPx: system.xPx + bar.xPx + bar.axisPx,
    yPx: top + ((TOP_LINE_PLACE - place) * layout.spacePx) / 2,
  }
}

/** Where the sound is: in a bar, and how much of it has passed, from 0 to 1. */
export type Playhead = Readonly<{ bar: number; fraction: number }>

export type PlayheadPlace = Readonly<{ xPx: number; topPx: number; bottomPx: number }>

/**
 * Where the line that follows the sound stands. It passes a bar's notes when they begin and travels on to the notes of
 * the next bar of the reading; from the last bar of a system it runs to the system's end.
 */
export function playheadPlace(layout: ScoreLayout, playhead: Playhead): PlayheadPlace | null {
  for (const system of layout.systems) {
    const i = system.bars.findIndex(({ number }) => number === playhead.bar)
    const bar = system.bars[i]
    if (!bar) continue
    const next = system.bars.slice(i + 1).find(({ isFolded }) => !isFolded)
    const from = bar.xPx + bar.axisPx
    const to = next ? next.xPx + next.axisPx : bar.xPx + bar.widthPx
    const fraction = Math.min(1, Math.max(0, playhead.fraction))
    return {
      xPx: system.xPx + from + (to - from) * fraction,
      topPx: system.yPx + system.stavesBox.top - layout.spacePx,
      bottomPx: system.yPx + system.stavesBox.bottom + layout.spacePx,
    }
  }
  return null
}

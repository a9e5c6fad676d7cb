import type { Box } from '@/shared/notation/box'
import { signatureAlteration } from '@/shared/notation/key-signature'
import { moveMark, type Mark } from '@/shared/notation/mark'
import {
  proposalMarks,
  wholeNoteMarks,
  wholeRestMarks,
  type StaffSetting,
} from '@/shared/notation/note-marks'
import { boxOf, placeClear } from '@/shared/notation/placing'
import type { ScoreBar } from '@/shared/notation/score-input'
import type { BarNotes } from '@/shared/theory/note'
import { formatPitch, pitchOf, type Alteration, type Pitch } from '@/shared/theory/pitch'

/** The notes of a bar on one staff, around the bar's axis at x = 0, the top staff line at y = 0. */
export type StaffContent = Readonly<{ marks: readonly Mark[]; box: Box | null }>

const contentOf = (marks: readonly Mark[]): StaffContent => ({ marks, box: boxOf(marks) })

export const EMPTY_CONTENT: StaffContent = contentOf([])

/** One written pitch at its moment in the bar, with the alteration its place already has there. */
type Onset = Readonly<{ tick: number; pitch: Pitch | null; standing: Alteration }>

/** An accidental holds to the bar line for its own place; a later note there needs one only when it differs. */
function onsetsOf(notes: BarNotes, signature: number): readonly Onset[] {
  const altered = new Map<string, Alteration>()
  let tick = 0
  return notes.map((note) => {
    const start = tick
    tick += note.ticks
    if (note.pitch === null) return { tick: start, pitch: null, standing: 0 }
    const pitch = pitchOf(note.pitch)
    const place = formatPitch({ ...pitch, alteration: 0 })
    const standing = altered.get(place) ?? signatureAlteration(signature, pitch.letter)
    altered.set(place, pitch.alteration)
    return { tick: start, pitch, standing }
  })
}

export function cantusContent(bar: ScoreBar, signature: number, setting: StaffSetting): StaffContent {
  if (bar.cantus === null) return EMPTY_CONTENT
  const pitch = pitchOf(bar.cantus)
  const standing = signatureAlteration(signature, pitch.letter)
  return contentOf(wholeNoteMarks(pitch, standing, setting, { ink: 'cantus', group: `${bar.number} cantus` }))
}

type Entry = Readonly<{ tick: number; height: number; isLine: boolean; marks: readonly Mark[] }>

const heightOf = (pitch: Pitch | null): number =>
  pitch ? 7 * pitch.octave + 'CDEFGAB'.indexOf(pitch.letter) : 0

function entriesOf(bar: ScoreBar, signature: number, setting: StaffSetting): readonly Entry[] {
  const line = onsetsOf(bar.line ?? [], signature).map((onset, i): Entry => {
    const look = { ink: 'line', group: `${bar.number} line ${i}` } as const
    const marks = onset.pitch
      ? wholeNoteMarks(onset.pitch, onset.standing, setting, look)
      : wholeRestMarks(setting.spacePx, look)
    return { tick: onset.tick, height: heightOf(onset.pitch), isLine: true, marks }
  })
  const proposals = bar.proposals.flatMap((proposal, p) =>
    onsetsOf(proposal.notes, signature).flatMap((onset, i): Entry[] => {
      if (onset.pitch === null) return []
      // The number stands once, at the first note of what was proposed.
      const shown = i === 0 ? proposal : { ...proposal, count: null }
      const group = `${bar.number} proposal ${p} ${i}`
      const marks = proposalMarks(onset.pitch, onset.standing, shown, setting, group)
      return [{ tick: onset.tick, height: heightOf(onset.pitch), isLine: false, marks }]
    }),
  )
  return [...line, ...proposals]
}

/** The notes of one moment: the agreed one on the axis, proposals from high to low, each moved clear of the rest. */
function columnOf(entries: readonly Entry[], clearancePx: number): readonly Mark[] {
  const sorted = [...entries].sort((a, b) => Number(b.isLine) - Number(a.isLine) || b.height - a.height)
  const standing: Mark[] = []
  for (const entry of sorted) standing.push(...placeClear(entry.marks, standing, clearancePx))
  const box = boxOf(standing.filter((mark) => mark.role === 'lozenge' || mark.role === 'count'))
  // Proposals among themselves have no axis of their own: the bunch is centred over the cantus.
  if (!box || entries.some((entry) => entry.isLine)) return standing
  return standing.map((mark) => moveMark(mark, -(box.left + box.right) / 2, 0))
}

/** The line's staff in a bar: the agreed line and the proposals, moment by moment from left to right. */
export function lineContent(bar: ScoreBar, signature: number, setting: StaffSetting): StaffContent {
  const entries = entriesOf(bar, signature, setting)
  const clearancePx = 0.2 * setting.spacePx
  const marks: Mark[] = []
  for (const tick of [...new Set(entries.map((entry) => entry.tick))].sort((a, b) => a - b)) {
    const column = columnOf(
      entries.filter((entry) => entry.tick === tick),
      clearancePx,
    )
    const before = boxOf(marks)
    const box = boxOf(column)
    const dx = before && box ? before.right + setting.spacePx - box.left : 0
    marks.push(...column.map((mark) => moveMark(mark, dx, 0)))
  }
  return contentOf(marks)
}

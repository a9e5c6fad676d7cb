import type { Box } from '@/shared/notation/box'
import { signatureAlteration } from '@/shared/notation/key-signature'
import { moveMark, type Mark } from '@/shared/notation/mark'
import {
  proposalMarks,
  wholeNoteMarks,
  wholeRestMarks,
  type StaffSetting,
} from '@/shared/notation/note-marks'
import { boxOf, clearingPx, type Clearance } from '@/shared/notation/placing'
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

/** Between two lozenges, and beside anything else, in staff spaces. */
const NESTED_GAP = 0.05
const BESIDE_GAP = 0.28

/** What stands at one moment, with its number on its right, and on its left. */
type Entry = Readonly<{
  tick: number
  height: number
  isLine: boolean
  right: readonly Mark[]
  left: readonly Mark[]
}>

const heightOf = (pitch: Pitch | null): number =>
  pitch ? 7 * pitch.octave + 'CDEFGAB'.indexOf(pitch.letter) : 0

function entriesOf(bar: ScoreBar, signature: number, setting: StaffSetting): readonly Entry[] {
  const line = onsetsOf(bar.line ?? [], signature).map((onset, i): Entry => {
    const look = { ink: 'line', group: `${bar.number} line ${i}` } as const
    const marks = onset.pitch
      ? wholeNoteMarks(onset.pitch, onset.standing, setting, look)
      : wholeRestMarks(setting.spacePx, look)
    return { tick: onset.tick, height: heightOf(onset.pitch), isLine: true, right: marks, left: marks }
  })
  const proposals = bar.proposals.flatMap((proposal, p) =>
    onsetsOf(proposal.notes, signature).flatMap((onset, i): Entry[] => {
      if (onset.pitch === null) return []
      // The number stands once, at the first note of what was proposed.
      const shown = i === 0 ? proposal : { ...proposal, count: null }
      const group = `${bar.number} proposal ${p} ${i}`
      const { pitch, standing } = onset
      const side = (countSide: 'left' | 'right'): readonly Mark[] =>
        proposalMarks(pitch, standing, shown, setting, { group, countSide })
      return [
        {
          tick: onset.tick,
          height: heightOf(onset.pitch),
          isLine: false,
          right: side('right'),
          left: side('left'),
        },
      ]
    }),
  )
  return [...line, ...proposals]
}

const moved = (marks: readonly Mark[], dx: number): readonly Mark[] =>
  dx === 0 ? marks : marks.map((mark) => moveMark(mark, dx, 0))

/**
 * Files of lozenges that stand one under the other, first to last. From high to low, each joins the first file in which
 * it touches nobody: notes a step apart fall to either side, as seconds do in a chord.
 */
function filesOf(entries: readonly Entry[], clearance: Clearance): readonly (readonly Entry[])[] {
  const files: Entry[][] = []
  const lozengesOf = (entry: Entry): readonly Mark[] => entry.right.filter(({ role }) => role === 'lozenge')
  for (const entry of entries) {
    const file = files.find((others) =>
      others.every((other) => clearingPx(lozengesOf(entry), lozengesOf(other), clearance) === 0),
    )
    if (file) file.push(entry)
    else files.push([entry])
  }
  return files
}

/** The notes of one moment: the agreed one on the axis, the proposals file by file to its right or around it. */
function columnOf(entries: readonly Entry[], clearance: Clearance): readonly Mark[] {
  const sorted = [...entries].sort((a, b) => b.height - a.height)
  const line = sorted.filter((entry) => entry.isLine).flatMap((entry) => entry.right)
  const files = filesOf(
    sorted.filter((entry) => !entry.isLine),
    clearance,
  )
  const standing: Mark[] = [...line]
  files.forEach((file, i) => {
    // With two files or more the numbers of the first stand on its left, out of the way of the second.
    const isOutward = i === 0 && files.length > 1 && line.length === 0
    const sides = file.map((entry) => (isOutward ? entry.left : entry.right))
    // In a file everyone stands at one distance, the greatest that any needs.
    const dx = Math.max(...sides.map((marks) => clearingPx(marks, standing, clearance)))
    for (const marks of sides) {
      const own = moved(marks, dx)
      standing.push(...moved(own, clearingPx(own, standing, clearance)))
    }
  })
  const box = boxOf(standing.filter((mark) => mark.role === 'lozenge' || mark.role === 'count'))
  // Proposals among themselves have no axis of their own: the bunch is centred over the cantus.
  return !box || line.length > 0 ? standing : moved(standing, -(box.left + box.right) / 2)
}

/** The line's staff in a bar: the agreed line and the proposals, moment by moment from left to right. */
export function lineContent(bar: ScoreBar, signature: number, setting: StaffSetting): StaffContent {
  const entries = entriesOf(bar, signature, setting)
  const clearance = { nestedPx: NESTED_GAP * setting.spacePx, besidePx: BESIDE_GAP * setting.spacePx }
  const marks: Mark[] = []
  for (const tick of [...new Set(entries.map((entry) => entry.tick))].sort((a, b) => a - b)) {
    const column = columnOf(
      entries.filter((entry) => entry.tick === tick),
      clearance,
    )
    const before = boxOf(marks)
    const box = boxOf(column)
    const dx = before && box ? before.right + setting.spacePx - box.left : 0
    marks.push(...column.map((mark) => moveMark(mark, dx, 0)))
  }
  return contentOf(marks)
}

import { uniteBoxes, type Box } from '@/shared/notation/box'
import { beamMark, moveMark, type Ink, type Mark } from '@/shared/notation/mark'
import {
  countMark,
  lozengeHalfPx,
  noteMarks,
  proposalMarks,
  restMarks,
  stemLeftPx,
  stemPx,
  type StaffSetting,
} from '@/shared/notation/note-marks'
import { ENGRAVING_DEFAULTS } from '@/shared/notation/bravura'
import { signatureAlteration } from '@/shared/notation/key-signature'
import { boxOf, clearingPx, type Clearance } from '@/shared/notation/placing'
import { soleReading, writtenNotes, type WrittenNote } from '@/shared/notation/reading'
import type { ProposalMark, ScoreBar } from '@/shared/notation/score-input'
import { staffPlaceOf } from '@/shared/notation/staff-place'
import { isStemUp, stemsOf, type Stem } from '@/shared/notation/stems'
import {
  openTieMark,
  stoppingShortPx,
  tieBetween,
  tieEnd,
  tieMark,
  tieReachPx,
  type TieEnd,
} from '@/shared/notation/ties'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes } from '@/shared/theory/note'
import { formatPitch, pitchOf, type Pitch } from '@/shared/theory/pitch'

/** What stands at one moment of a bar, around its own x = 0, the top staff line at y = 0. */
export type Column = Readonly<{ tick: number; marks: readonly Mark[]; box: Box }>

/** A beam from one column to another, its ends from their axes. */
type BeamJoint = Readonly<{
  kind: 'beam'
  from: number
  to: number
  start: readonly [x: number, y: number]
  end: readonly [x: number, y: number]
  thicknessPx: number
  ink: Ink
  group: string
}>
type TieJoint = Readonly<{
  kind: 'tie'
  from: number
  to: number
  end: TieEnd
  shortPx: number
  group: string
}>

/** The notes of a bar on one staff, moment by moment; `joints` are what runs from one to another. */
export type StaffContent = Readonly<{
  columns: readonly Column[]
  joints: readonly (BeamJoint | TieJoint)[]
  /** The end of a tie over the bar line, at the last column, and of one from the bar before, at the first. */
  tieOver: TieEnd | null
  tieInto: TieEnd | null
  /** Top and bottom of it all; null where there is nothing. */
  reach: Readonly<{ top: number; bottom: number }> | null
}>

export const EMPTY_CONTENT: StaffContent = {
  columns: [],
  joints: [],
  tieOver: null,
  tieInto: null,
  reach: null,
}

const columnAt = (tick: number, marks: readonly Mark[]): Column => ({
  tick,
  marks,
  box: boxOf(marks) ?? { left: 0, right: 0, top: 0, bottom: 0 },
})

function contentOf(
  columns: readonly Column[],
  over: Partial<Omit<StaffContent, 'columns' | 'reach'>>,
  spacePx: number,
): StaffContent {
  const content = { ...EMPTY_CONTENT, ...over, columns }
  if (columns.length === 0) return content
  const { top, bottom } = uniteBoxes(columns.map(({ box }) => box))
  const ends = [
    content.tieOver,
    content.tieInto,
    ...content.joints.map((joint) => (joint.kind === 'tie' ? joint.end : null)),
  ]
  const ties = ends.flatMap((end) => (end ? [tieReachPx(end, spacePx)] : []))
  return { ...content, reach: { top: Math.min(top, ...ties), bottom: Math.max(bottom, ...ties) } }
}

/** All the marks of a bar on a staff, its columns standing at `xs` from the bar's left edge. */
export function marksAt(
  { columns, joints }: StaffContent,
  xs: readonly number[],
  spacePx: number,
): readonly Mark[] {
  const xOf = (column: number): number => xs[column] ?? 0
  return [
    ...columns.flatMap(({ marks }, i) => moved(marks, xOf(i))),
    ...joints.map((joint): Mark => {
      if (joint.kind === 'tie')
        return tieMark(joint.end, xOf(joint.from), xOf(joint.to) - joint.shortPx, spacePx, joint.group)
      const { start, end, ink, group } = joint
      return beamMark(
        { role: 'beam', ink, group },
        [xOf(joint.from) + start[0], start[1]],
        [xOf(joint.to) + end[0], end[1]],
        joint.thicknessPx,
      )
    }),
  ]
}

export function cantusContent(bar: ScoreBar, signature: number, setting: StaffSetting): StaffContent {
  if (bar.cantus === null) return EMPTY_CONTENT
  const pitch = pitchOf(bar.cantus)
  const standing = signatureAlteration(signature, pitch.letter)
  const look = { ink: 'cantus', group: `${bar.number} cantus` } as const
  const whole = { value: 'whole', isDotted: false } as const
  return contentOf([columnAt(0, noteMarks(pitch, standing, whole, null, setting, look))], {}, setting.spacePx)
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

const isSamePitch = (a: Pitch | null, b: Pitch | null | undefined): boolean =>
  a !== null && b != null && formatPitch(a) === formatPitch(b)

/** How a bar is to be read, beyond what stands in it. */
export type BarContext = Readonly<{
  signature: number
  setting: StaffSetting
  /** Notes of several values are told apart in this score. */
  isMeasured: boolean
  /** The first note is held over from the bar before; the last one into the bar after. */
  isHeldInto: boolean
  isTiedOver: boolean
}>

/** One reading of a bar, set by itself or among others. */
type SetReading = Readonly<{
  notes: readonly WrittenNote[]
  stems: readonly (Stem | null)[]
  entries: readonly Entry[]
}>

function setReading(
  bar: ScoreBar,
  written: BarNotes,
  source: Readonly<{ proposal: ProposalMark | null; name: string; isAlone: boolean }>,
  context: BarContext,
): SetReading & Readonly<{ beams: ReturnType<typeof stemsOf>['beams'] }> {
  const { signature, setting, isHeldInto, isTiedOver } = context
  const { proposal, name, isAlone } = source
  const { spacePx } = setting
  const notes = writtenNotes(written, signature, isAlone && isHeldInto)
  const placeOf = (pitch: Pitch | null): number | null => (pitch ? staffPlaceOf(pitch, setting.clef) : null)
  const { stems, beams } = stemsOf(
    notes.map((note) => ({ ...note, place: placeOf(note.pitch) })),
    !isAlone,
  )
  const ink: Ink = proposal ? proposal.tone : 'line'
  // The number stands once, at the first note of what was proposed.
  const firstSounding = notes.findIndex(({ pitch }) => pitch !== null)
  const entries = notes.flatMap((note, i): Entry[] => {
    const group = `${bar.number} ${name} ${i}`
    const look = { ink, group }
    const isCounted = i === (firstSounding < 0 ? 0 : firstSounding)
    const base = { tick: note.tick, height: heightOf(note.pitch), isLine: proposal === null }
    const stem = stems[i] ?? null
    const { pitch } = note
    if (pitch === null) {
      // Among several readings a rest says nothing but that its reading begins later.
      if (!isAlone && proposal && firstSounding >= 0) return []
      const rest = restMarks(note.written, spacePx, look)
      const count = proposal && isCounted ? proposal.count : null
      const counted = (countSide: 'left' | 'right'): readonly Mark[] =>
        count === null
          ? rest
          : [...rest, countMark(rest, 2 * spacePx, { count, tone: ink, countSide, group }, spacePx)]
      return [{ ...base, right: counted('right'), left: counted('left') }]
    }
    const isLast = i === notes.length - 1
    const isJoined = isAlone && (isLast ? isTiedOver : isSamePitch(pitch, notes[i + 1]?.pitch))
    const isOpen = note.isTied && !isJoined
    const place = placeOf(pitch) as number
    const count = proposal && isCounted ? proposal.count : null
    const halfPx = proposal ? lozengeHalfPx(count, spacePx) : 0.5 * spacePx
    const isUp = stem?.isUp ?? isStemUp(place)
    const head = { place, isUp, halfPx, isDotted: note.written.isDotted, hasCount: count !== null, ink }
    const open = isOpen ? [openTieMark(tieEnd(head, spacePx), spacePx, `${group} tie`)] : []
    if (!proposal) {
      const marks = [...noteMarks(pitch, note.standing, note.written, stem, setting, look), ...open]
      return [{ ...base, right: marks, left: marks }]
    }
    const shown = isCounted ? proposal : { ...proposal, count: null }
    const rhythm = context.isMeasured ? { written: note.written, stem } : null
    const side = (countSide: 'left' | 'right'): readonly Mark[] => {
      const marks = proposalMarks(pitch, note.standing, shown, setting, { group, countSide, rhythm })
      return [...marks, ...open]
    }
    return [{ ...base, right: side('right'), left: side('left') }]
  })
  return { notes, stems, entries, beams }
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

/** A reading that has its bar to itself: beams and ties run from note to note. */
function aloneContent(
  bar: ScoreBar,
  context: BarContext,
  notes: BarNotes,
  proposal: ProposalMark | null,
): StaffContent {
  const { setting, isHeldInto, isTiedOver } = context
  const { spacePx, clef } = setting
  const name = proposal ? 'proposal 0' : 'line'
  const set = setReading(bar, notes, { proposal, name, isAlone: true }, context)
  const ink: Ink = proposal ? proposal.tone : 'line'
  const columns = set.entries.map(({ tick, right }) => columnAt(tick, right))
  const beams = set.beams.map((beam): BeamJoint => {
    const left = proposal ? -stemPx(spacePx) / 2 : stemLeftPx(beam.isUp, spacePx)
    const tipOf = (i: number): number => (set.stems[i]?.tipDepth ?? 0) * spacePx
    return {
      kind: 'beam',
      from: beam.from,
      to: beam.to,
      start: [left, tipOf(beam.from)],
      end: [left + stemPx(spacePx), tipOf(beam.to)],
      thicknessPx: (beam.isUp ? 1 : -1) * ENGRAVING_DEFAULTS.beamThickness * spacePx,
      ink,
      group: `${bar.number} beam ${beam.from}`,
    }
  })
  const firstSounding = set.notes.findIndex(({ pitch }) => pitch !== null)
  const endOf = (i: number): TieEnd | null => {
    const note = set.notes[i]
    if (!note?.pitch) return null
    const count = proposal && i === firstSounding ? proposal.count : null
    const halfPx = proposal ? lozengeHalfPx(count, spacePx) : 0.5 * spacePx
    const { isDotted } = note.written
    const place = staffPlaceOf(note.pitch, clef)
    const isUp = set.stems[i]?.isUp ?? isStemUp(place)
    return tieEnd({ place, isUp, halfPx, isDotted, hasCount: count !== null, ink }, spacePx)
  }
  const ties = set.notes.flatMap((note, i): TieJoint[] => {
    const end = endOf(i)
    if (!note.isTied || !end || !isSamePitch(note.pitch, set.notes[i + 1]?.pitch)) return []
    const shortPx = stoppingShortPx(end, endOf(i + 1), spacePx)
    return [
      {
        kind: 'tie',
        from: i,
        to: i + 1,
        end: tieBetween(end, endOf(i + 1)),
        shortPx,
        group: `${bar.number} tie ${i}`,
      },
    ]
  })
  return contentOf(
    columns,
    {
      joints: [...beams, ...ties],
      tieOver: isTiedOver ? endOf(set.notes.length - 1) : null,
      tieInto: isHeldInto ? endOf(0) : null,
    },
    spacePx,
  )
}

/** The line's staff in a bar: the agreed line and the proposals, moment by moment from left to right. */
export function lineContent(bar: ScoreBar, context: BarContext): StaffContent {
  const sole = soleReading(bar)
  if (sole && context.isMeasured) return aloneContent(bar, context, sole.notes, sole.proposal)
  const { spacePx } = context.setting
  const entriesOf = (notes: BarNotes, proposal: ProposalMark | null, name: string): readonly Entry[] =>
    setReading(bar, notes, { proposal, name, isAlone: false }, context).entries
  const entries = [
    ...(bar.line ? entriesOf(bar.line, null, 'line') : []),
    ...bar.proposals.flatMap((proposal, p) => entriesOf(proposal.notes, proposal, `proposal ${p}`)),
  ]
  const clearance = { nestedPx: NESTED_GAP * spacePx, besidePx: BESIDE_GAP * spacePx }
  const ticks = [...new Set(entries.map((entry) => entry.tick))].sort((a, b) => a - b)
  const columns = ticks.map((tick) => {
    const here = entries.filter((entry) => entry.tick === tick)
    return columnAt(tick, columnOf(here, clearance))
  })
  return contentOf(columns, {}, spacePx)
}

/** How long each column lasts, to the next or to the bar line. */
export const columnTicks = (columns: readonly Pick<Column, 'tick'>[]): readonly number[] =>
  columns.map(({ tick }, i) => Math.max(1, (columns[i + 1]?.tick ?? WHOLE_TICKS) - tick))

import { uniteBoxes } from '@/shared/notation/box'
import { BRAVURA, ENGRAVING_DEFAULTS } from '@/shared/notation/bravura'
import type { GlyphName } from '@/shared/notation/glyphs'
import { accidentalFor } from '@/shared/notation/key-signature'
import {
  crispPx,
  glyphMark,
  lozengeMark,
  LOZENGE_STRETCH,
  rectangleMark,
  ruleMark,
  textMark,
  type Ink,
  type Mark,
} from '@/shared/notation/mark'
import { textHeightPx } from '@/shared/notation/measure-text'
import type { ProposalMark } from '@/shared/notation/score-input'
import { letteringOf } from '@/shared/notation/sizes'
import { depthStaffSpaces, ledgerPlaces, staffPlaceOf } from '@/shared/notation/staff-place'
import type { Stem } from '@/shared/notation/stems'
import type { Clef } from '@/shared/theory/clef'
import type { NoteValue, WrittenValue } from '@/shared/theory/note-value'
import type { Alteration, Pitch } from '@/shared/theory/pitch'

/** Where a staff's notes are set: its clef, and px to a staff space. Marks come out with the top staff line at y = 0. */
export type StaffSetting = Readonly<{ clef: Clef; spacePx: number }>

type Look = Readonly<{ ink: Ink; group: string }>

const ACCIDENTAL_GAP = 0.25
const COUNT_GAP = 0.25

function ledgerMarks(
  place: number,
  halfWidthPx: number,
  setting: StaffSetting,
  group: string,
): readonly Mark[] {
  const { spacePx } = setting
  const reach = halfWidthPx + ENGRAVING_DEFAULTS.legerLineExtension * spacePx
  const thickness = crispPx(ENGRAVING_DEFAULTS.legerLineThickness, spacePx)
  return ledgerPlaces(place).map((line) => {
    const y = depthStaffSpaces(line) * spacePx
    return ruleMark({ role: 'ledger', ink: 'staff', group }, [-reach, y], [reach, y], thickness)
  })
}

/** An accidental whose right edge clears a head reaching `halfWidthPx` left of the axis, and its ledger lines. */
function accidentalMark(
  glyph: GlyphName,
  place: number,
  halfWidthPx: number,
  setting: StaffSetting,
  look: Look,
): Mark {
  const { spacePx } = setting
  const ledger = ledgerPlaces(place).length > 0 ? ENGRAVING_DEFAULTS.legerLineExtension : 0
  const right = -halfWidthPx - (ledger + ACCIDENTAL_GAP) * spacePx
  const x = right - BRAVURA[glyph].right * spacePx
  return glyphMark({ role: 'accidental', ...look }, glyph, x, depthStaffSpaces(place) * spacePx, spacePx)
}

const HEADS: Readonly<Record<NoteValue, GlyphName>> = {
  whole: 'noteheadWhole',
  half: 'noteheadHalf',
  quarter: 'noteheadBlack',
  eighth: 'noteheadBlack',
}

const DOT_GAP = 0.3

/** The dot beside a head reaching `rightPx` right of the axis; by a note on a line it stands in the space above. */
function dotMark(place: number, rightPx: number, spacePx: number, look: Look): Mark {
  const ledger = ledgerPlaces(place).length > 0 ? ENGRAVING_DEFAULTS.legerLineExtension : 0
  const y = depthStaffSpaces(place % 2 === 0 ? place + 1 : place) * spacePx
  const x = rightPx + (ledger + DOT_GAP) * spacePx
  return glyphMark({ role: 'dot', ...look }, 'augmentationDot', x, y, spacePx)
}

/** A stem whose side towards the flag is at `leftPx`, from the head to its tip, and its flag. */
function stemMarks(stem: Stem, leftPx: number, headPx: number, spacePx: number, look: Look): readonly Mark[] {
  const tip = stem.tipDepth * spacePx
  const right = leftPx + stemPx(spacePx)
  const box = { left: leftPx, right, top: Math.min(tip, headPx), bottom: Math.max(tip, headPx) }
  const marks = [rectangleMark({ role: 'stem', ...look }, box)]
  if (!stem.hasFlag) return marks
  const flag = stem.isUp ? 'flag8thUp' : 'flag8thDown'
  return [...marks, glyphMark({ role: 'flag', ...look }, flag, leftPx, tip, spacePx)]
}

export const stemPx = (spacePx: number): number => Math.max(1.2, ENGRAVING_DEFAULTS.stemThickness * spacePx)

/** Left side of the stem of a solid head, from its axis. */
export function stemLeftPx(isUp: boolean, spacePx: number): number {
  const half = (BRAVURA.noteheadBlack.right * spacePx) / 2
  return isUp ? half - stemPx(spacePx) : -half
}

/** How far above its middle a head meets the right side of its stem, by the font's own anchor. */
const STEM_ANCHOR = BRAVURA.noteheadBlack.anchors.stemUpSE?.[1] ?? 0

/** A note of the cantus or the agreed line, its head centred on x = 0. */
export function noteMarks(
  pitch: Pitch,
  standing: Alteration,
  { value, isDotted }: WrittenValue,
  stem: Stem | null,
  setting: StaffSetting,
  look: Look,
): readonly Mark[] {
  const { spacePx, clef } = setting
  const place = staffPlaceOf(pitch, clef)
  const head = HEADS[value]
  const half = (BRAVURA[head].right * spacePx) / 2
  const y = depthStaffSpaces(place) * spacePx
  const accidental = accidentalFor(pitch, standing)
  const meets = stem ? y + (stem.isUp ? -1 : 1) * STEM_ANCHOR * spacePx : y
  return [
    ...ledgerMarks(place, half, setting, look.group),
    glyphMark({ role: 'notehead', ...look }, head, -half, y, spacePx),
    ...(stem ? stemMarks(stem, stemLeftPx(stem.isUp, spacePx), meets, spacePx, look) : []),
    ...(isDotted ? [dotMark(place, half, spacePx, look)] : []),
    ...(accidental ? [accidentalMark(accidental, place, half, setting, look)] : []),
  ]
}

/** Each rest, and the depth of its origin: the whole rest hangs from the fourth line, the others stand on the middle one. */
const RESTS: Readonly<Record<NoteValue, readonly [glyph: GlyphName, depth: number]>> = {
  whole: ['restWhole', 1],
  half: ['restHalf', 2],
  quarter: ['restQuarter', 2],
  eighth: ['rest8th', 2],
}

export function restMarks(written: WrittenValue, spacePx: number, look: Look): readonly Mark[] {
  const [glyph, depth] = RESTS[written.value]
  const half = (BRAVURA[glyph].right * spacePx) / 2
  return [
    glyphMark({ role: 'rest', ...look }, glyph, -half, depth * spacePx, spacePx),
    ...(written.isDotted ? [dotMark(5, half, spacePx, look)] : []),
  ]
}

const UNCOUNTED_RADIUS = 0.74
const LEAST_RADIUS = 0.42
const MOST_RADIUS = 1.1
const RADIUS_BY_DOUBLING = 0.105

/**
 * Half the height of a proposal's lozenge in staff spaces. Each doubling of the number adds the same, so that a crowd
 * shows without swallowing the staff; the size of one count never depends on the others.
 */
export const lozengeRadiusStaffSpaces = (count: number | null): number =>
  count === null
    ? UNCOUNTED_RADIUS
    : Math.min(MOST_RADIUS, LEAST_RADIUS + RADIUS_BY_DOUBLING * Math.log2(Math.max(1, count)))

/** How a proposal's lozenge is written where values are: a short note is solid, and its stem grows from its point. */
export type WrittenLozenge = Readonly<{ written: WrittenValue; stem: Stem | null }>

type ProposalLook = Readonly<{
  group: string
  countSide: 'left' | 'right'
  /** Null where every note is whole, and a solid lozenge can tell of a broken law. */
  rhythm?: WrittenLozenge | null | undefined
}>

const isSolid = ({ tone }: Pick<ProposalMark, 'tone'>, rhythm: WrittenLozenge | null): boolean =>
  rhythm ? rhythm.written.value === 'quarter' || rhythm.written.value === 'eighth' : tone === 'breach'

/** The largest lozenge among notes of several values, so that four stand beside each other. */
const MOST_RHYTHMIC_RADIUS = 0.74

const lozengeStrokePx = (spacePx: number): number => Math.max(1.5, 0.16 * spacePx)

const radiusPx = (count: number | null, isMeasured: boolean, spacePx: number): number =>
  Math.min(isMeasured ? MOST_RHYTHMIC_RADIUS : MOST_RADIUS, lozengeRadiusStaffSpaces(count)) * spacePx

/** Half the height of a proposal's lozenge among notes of several values, its outline included. */
export const lozengeHalfPx = (count: number | null, spacePx: number): number =>
  radiusPx(count, true, spacePx) + 0.7 * lozengeStrokePx(spacePx)

/** A proposal: its lozenge centred on x = 0, the number on the side asked for, outside any accidental. */
export function proposalMarks(
  pitch: Pitch,
  standing: Alteration,
  proposal: Pick<ProposalMark, 'tone' | 'count'>,
  setting: StaffSetting,
  look: ProposalLook,
): readonly Mark[] {
  const { spacePx, clef } = setting
  const { tone, count } = proposal
  const { group, countSide, rhythm = null } = look
  const place = staffPlaceOf(pitch, clef)
  const y = depthStaffSpaces(place) * spacePx
  const radius = radiusPx(count, rhythm !== null, spacePx)
  const strokePx = lozengeStrokePx(spacePx)
  const half = radius * LOZENGE_STRETCH + strokePx * 0.7
  const accidental = accidentalFor(pitch, standing)
  const ink = { ink: tone, group }
  const stem = rhythm?.stem ?? null
  const stemLook = [-stemPx(spacePx) / 2, y + (stem?.isUp ? -radius : radius), spacePx, ink] as const
  const marks: Mark[] = [
    ...ledgerMarks(place, half, setting, group),
    ...(stem ? stemMarks(stem, ...stemLook) : []),
    lozengeMark({ role: 'lozenge', ...ink }, 0, y, radius, { isFilled: isSolid(proposal, rhythm), strokePx }),
    ...(rhythm?.written.isDotted ? [dotMark(place, half, spacePx, ink)] : []),
    ...(accidental ? [accidentalMark(accidental, place, half, setting, ink)] : []),
  ]
  return count === null ? marks : [...marks, countMark(marks, y, { count, tone, countSide, group }, spacePx)]
}

/** The number of those who proposed, beside the marks it belongs to. */
export function countMark(
  marks: readonly Mark[],
  y: number,
  { count, tone, countSide, group }: { count: number; tone: Ink; countSide: 'left' | 'right'; group: string },
  spacePx: number,
): Mark {
  const { left, right } = uniteBoxes(marks.map((mark) => mark.box))
  const { countPx } = letteringOf(spacePx)
  const gap = Math.max(2, COUNT_GAP * spacePx)
  const [x, anchor] =
    countSide === 'right' ? ([right + gap, 'start'] as const) : ([left - gap, 'end'] as const)
  const baseline = y + textHeightPx('8', 'AlegreyaSansMedium', countPx).above / 2
  const name = { role: 'count', ink: tone, group } as const
  return textMark(name, String(count), x, baseline, { face: 'AlegreyaSansMedium', sizePx: countPx, anchor })
}

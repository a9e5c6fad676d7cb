import { uniteBoxes } from '@/shared/notation/box'
import { BRAVURA, ENGRAVING_DEFAULTS } from '@/shared/notation/bravura'
import type { GlyphName } from '@/shared/notation/glyphs'
import { accidentalFor } from '@/shared/notation/key-signature'
import {
  crispPx,
  glyphMark,
  lozengeMark,
  LOZENGE_STRETCH,
  ruleMark,
  textMark,
  type Ink,
  type Mark,
} from '@/shared/notation/mark'
import { textHeightPx } from '@/shared/notation/measure-text'
import type { ProposalMark } from '@/shared/notation/score-input'
import { letteringOf } from '@/shared/notation/sizes'
import { depthStaffSpaces, ledgerPlaces, staffPlaceOf } from '@/shared/notation/staff-place'
import type { Clef } from '@/shared/theory/clef'
import type { Alteration, Pitch } from '@/shared/theory/pitch'

/** Where a staff's notes are set: its clef, and px to a staff space. Marks come out with the top staff line at y = 0. */
export type StaffSetting = Readonly<{ clef: Clef; spacePx: number }>

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
  look: { ink: Ink; group: string },
): Mark {
  const { spacePx } = setting
  const ledger = ledgerPlaces(place).length > 0 ? ENGRAVING_DEFAULTS.legerLineExtension : 0
  const right = -halfWidthPx - (ledger + ACCIDENTAL_GAP) * spacePx
  const x = right - BRAVURA[glyph].right * spacePx
  return glyphMark({ role: 'accidental', ...look }, glyph, x, depthStaffSpaces(place) * spacePx, spacePx)
}

/** A whole note of the cantus or the agreed line, its head centred on x = 0. */
export function wholeNoteMarks(
  pitch: Pitch,
  standing: Alteration,
  setting: StaffSetting,
  look: { ink: Ink; group: string },
): readonly Mark[] {
  const { spacePx, clef } = setting
  const place = staffPlaceOf(pitch, clef)
  const half = (BRAVURA.noteheadWhole.right * spacePx) / 2
  const y = depthStaffSpaces(place) * spacePx
  const accidental = accidentalFor(pitch, standing)
  return [
    ...ledgerMarks(place, half, setting, look.group),
    glyphMark({ role: 'notehead', ...look }, 'noteheadWhole', -half, y, spacePx),
    ...(accidental ? [accidentalMark(accidental, place, half, setting, look)] : []),
  ]
}

/** A rest of a whole bar, hanging from the fourth line. */
export const wholeRestMarks = (spacePx: number, look: { ink: Ink; group: string }): readonly Mark[] => [
  glyphMark(
    { role: 'notehead', ...look },
    'restWhole',
    (-BRAVURA.restWhole.right * spacePx) / 2,
    spacePx,
    spacePx,
  ),
]

const UNCOUNTED_RADIUS = 0.74
const LEAST_RADIUS = 0.4
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

/** A proposal: its lozenge centred on x = 0, the number on the side asked for, outside any accidental. */
export function proposalMarks(
  pitch: Pitch,
  standing: Alteration,
  proposal: Pick<ProposalMark, 'tone' | 'count'>,
  setting: StaffSetting,
  look: Readonly<{ group: string; countSide: 'left' | 'right' }>,
): readonly Mark[] {
  const { spacePx, clef } = setting
  const { tone, count } = proposal
  const { group, countSide } = look
  const place = staffPlaceOf(pitch, clef)
  const y = depthStaffSpaces(place) * spacePx
  const radius = lozengeRadiusStaffSpaces(count) * spacePx
  const strokePx = Math.max(1.5, 0.16 * spacePx)
  const half = radius * LOZENGE_STRETCH + strokePx * 0.7
  const accidental = accidentalFor(pitch, standing)
  const marks: Mark[] = [
    ...ledgerMarks(place, half, setting, group),
    lozengeMark({ role: 'lozenge', ink: tone, group }, 0, y, radius, {
      isFilled: tone === 'breach',
      strokePx,
    }),
    ...(accidental ? [accidentalMark(accidental, place, half, setting, { ink: tone, group })] : []),
  ]
  if (count === null) return marks
  const { left, right } = uniteBoxes(marks.map((mark) => mark.box))
  const { countPx } = letteringOf(spacePx)
  const gap = Math.max(2, COUNT_GAP * spacePx)
  const [x, anchor] =
    countSide === 'right' ? ([right + gap, 'start'] as const) : ([left - gap, 'end'] as const)
  const baseline = y + textHeightPx('8', 'AlegreyaSansMedium', countPx).above / 2
  const name = { role: 'count', ink: tone, group } as const
  marks.push(
    textMark(name, String(count), x, baseline, { face: 'AlegreyaSansMedium', sizePx: countPx, anchor }),
  )
  return marks
}

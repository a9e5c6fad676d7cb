import { escapeXml } from '@/shared/interchange/xml'
import type { Exercise } from '@/shared/rules/rule'
import type { Clef } from '@/shared/theory/clef'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import { signatureAlteration, signatureOf } from '@/shared/theory/key'
import type { BarNotes, Line, Note } from '@/shared/theory/note'
import { formatPitch, pitchOf, type Alteration } from '@/shared/theory/pitch'

/** A score to be written: an exercise with its line, and how it is set. */
export type ScoreToWrite = Readonly<{
  title: string
  exercise: Exercise
  /** `null` writes the cantus alone. */
  line: Line | null
  clefs: Readonly<{ cantus: Clef; line: Clef }>
}>

const CLEF_SIGNS: Readonly<Record<Clef, readonly [sign: string, line: number, octave: number]>> = {
  treble: ['G', 2, 0],
  'treble-8vb': ['G', 2, -1],
  alto: ['C', 3, 0],
  tenor: ['C', 4, 0],
  bass: ['F', 4, 0],
}

/** Note types with their lengths; a dot adds half. */
const TYPES: readonly (readonly [ticks: number, type: string, dots: number])[] = [
  [WHOLE_TICKS, 'whole', 0],
  [3 * QUARTER_TICKS, 'half', 1],
  [2 * QUARTER_TICKS, 'half', 0],
  [1.5 * QUARTER_TICKS, 'quarter', 1],
  [QUARTER_TICKS, 'quarter', 0],
  [0.75 * QUARTER_TICKS, 'eighth', 1],
  [0.5 * QUARTER_TICKS, 'eighth', 0],
  [0.25 * QUARTER_TICKS, '16th', 0],
]

const ACCIDENTALS: Readonly<Record<Alteration, string>> = {
  [-2]: 'flat-flat',
  [-1]: 'flat',
  0: 'natural',
  1: 'sharp',
  2: 'double-sharp',
}

type PartToWrite = Readonly<{ id: string; name: string; clef: Clef; bars: readonly BarNotes[] }>

/** Writes a score as MusicXML 4.0, partwise, the upper voice first. What is unwritten is a gap, not a rest. */
export function formatMusicXml({ title, exercise, line, clefs }: ScoreToWrite): string {
  const { cantus, mode, final, position } = exercise
  const cantusPart: PartToWrite = {
    id: 'P-cantus',
    name: 'Cantus firmus',
    clef: clefs.cantus,
    bars: cantus.map((pitch) => [{ pitch: formatPitch(pitch), ticks: WHOLE_TICKS }]),
  }
  const linePart: PartToWrite = {
    id: 'P-line',
    name: 'Counterpoint',
    clef: clefs.line,
    bars: cantus.map((_, index) => line?.[index + 1] ?? []),
  }
  const both = position === 'above' ? [linePart, cantusPart] : [cantusPart, linePart]
  const parts = line === null ? [cantusPart] : both
  const fifths = signatureOf(mode, final) ?? 0
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    '<!DOCTYPE score-partwise PUBLIC "-//Recordare//DTD MusicXML 4.0 Partwise//EN" "http://www.musicxml.org/dtds/partwise.dtd">',
    '<score-partwise version="4.0">',
    `<work><work-title>${escapeXml(title)}</work-title></work>`,
    '<part-list>',
    ...parts.map(({ id, name }) => `<score-part id="${id}"><part-name>${name}</part-name></score-part>`),
    '</part-list>',
    ...parts.map((part) => formatPart(part, fifths, mode)),
    '</score-partwise>',
    '',
  ].join('\n')
}

function formatPart({ id, clef, bars }: PartToWrite, fifths: number, mode: string): string {
  const [sign, line, octave] = CLEF_SIGNS[clef]
  const change = octave === 0 ? '' : `<clef-octave-change>${octave}</clef-octave-change>`
  const attributes = `<attributes><divisions>${QUARTER_TICKS}</divisions><key><fifths>${fifths}</fifths><mode>${mode}</mode></key><time><beats>4</beats><beat-type>4</beat-type></time><clef><sign>${sign}</sign><line>${line}</line>${change}</clef></attributes>`
  let isHeld = false
  const measures = bars.map((notes, index) => {
    const isLast = index === bars.length - 1
    const standing = new Map<string, Alteration>()
    const written = notes.map((note) => {
      const text = formatNote(note, isHeld, fifths, standing)
      isHeld = note.tied === true
      return text
    })
    const filled = notes.reduce((sum, { ticks }) => sum + ticks, 0)
    if (filled < WHOLE_TICKS) isHeld = false
    const gap = filled < WHOLE_TICKS ? `<forward><duration>${WHOLE_TICKS - filled}</duration></forward>` : ''
    const end = isLast ? '<barline location="right"><bar-style>light-heavy</bar-style></barline>' : ''
    return `<measure number="${index + 1}">${index === 0 ? attributes : ''}${written.join('')}${gap}${end}</measure>`
  })
  return `<part id="${id}">\n${measures.join('\n')}\n</part>`
}

/** In the order of elements that the format demands. `standing` holds the accidentals of the bar so far. */
function formatNote(
  { pitch, ticks, tied }: Note,
  isHeld: boolean,
  fifths: number,
  standing: Map<string, Alteration>,
): string {
  const type = TYPES.find(([length]) => length === ticks)
  const shape = type ? `<type>${type[1]}</type>${'<dot/>'.repeat(type[2])}` : ''
  if (pitch === null) return `<note><rest/><duration>${ticks}</duration><voice>1</voice>${shape}</note>`
  const { letter, alteration, octave } = pitchOf(pitch)
  const staffPlace = `${letter}${octave}`
  const known = standing.get(staffPlace) ?? signatureAlteration(fifths, letter)
  const accidental =
    alteration === known || isHeld ? '' : `<accidental>${ACCIDENTALS[alteration]}</accidental>`
  standing.set(staffPlace, alteration)
  const alter = alteration === 0 ? '' : `<alter>${alteration}</alter>`
  const ends = [...(isHeld ? ['stop'] : []), ...(tied ? ['start'] : [])]
  const ties = ends.map((end) => `<tie type="${end}"/>`).join('')
  const notations =
    ends.length === 0 ? '' : `<notations>${ends.map((end) => `<tied type="${end}"/>`).join('')}</notations>`
  return `<note><pitch><step>${letter}</step>${alter}<octave>${octave}</octave></pitch><duration>${ticks}</duration>${ties}<voice>1</voice>${shape}${accidental}${notations}</note>`
}

import { signatureAlteration } from '@/shared/notation/key-signature'
import type { ProposalMark, ScoreBar, ScoreInput } from '@/shared/notation/score-input'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes } from '@/shared/theory/note'
import { valueOf, type WrittenValue } from '@/shared/theory/note-value'
import { formatPitch, pitchOf, type Alteration, type Pitch } from '@/shared/theory/pitch'

/** One written note or rest at its moment in the bar, with the alteration its place already has there. */
export type WrittenNote = Readonly<{
  tick: number
  written: WrittenValue
  pitch: Pitch | null
  standing: Alteration
  /** Tied to the note that follows, in this bar or the next. */
  isTied: boolean
}>

/**
 * An accidental holds to the bar line for its own place; a later note there needs one only when it differs. A note held
 * over the bar line needs none, and lends none to those after it.
 */
export function writtenNotes(
  notes: BarNotes,
  signature: number,
  isHeldInto: boolean,
): readonly WrittenNote[] {
  const altered = new Map<string, Alteration>()
  let tick = 0
  return notes.map((note, i) => {
    const start = tick
    tick += note.ticks
    const written = valueOf(note.ticks)
    if (note.pitch === null) return { tick: start, written, pitch: null, standing: 0, isTied: false }
    const pitch = pitchOf(note.pitch)
    const isTied = note.tied === true
    if (i === 0 && isHeldInto) return { tick: start, written, pitch, standing: pitch.alteration, isTied }
    const place = formatPitch({ ...pitch, alteration: 0 })
    const standing = altered.get(place) ?? signatureAlteration(signature, pitch.letter)
    altered.set(place, pitch.alteration)
    return { tick: start, written, pitch, standing, isTied }
  })
}

/** The only reading that stands in a bar: the agreed line, or a single proposal. Null where there are several, or none. */
export type SoleReading = Readonly<{ notes: BarNotes; proposal: ProposalMark | null }>

export function soleReading({ line, proposals, isSetAside }: ScoreBar): SoleReading | null {
  if (isSetAside) return null
  const [only] = proposals
  if (line) return only ? null : { notes: line, proposal: null }
  return only && proposals.length === 1 ? { notes: only.notes, proposal: only } : null
}

/** True when the last note of a bar is held over the bar line into the next, and both can be seen to be. */
export function isTiedOver(bar: ScoreBar | undefined, next: ScoreBar | undefined): boolean {
  if (!bar || !next || next.number !== bar.number + 1) return false
  const last = soleReading(bar)?.notes.at(-1)
  const first = soleReading(next)?.notes[0]
  return last?.tied === true && last.pitch !== null && last.pitch === first?.pitch
}

const isOneWhole = (notes: BarNotes): boolean =>
  notes.length === 1 && notes[0]?.ticks === WHOLE_TICKS && !notes[0].tied

/** Whether notes of several values are to be told apart: then bars begin at their left, and a short note is a solid one. */
export const isMeasured = (input: Pick<ScoreInput, 'bars' | 'isMeasured'>): boolean =>
  input.isMeasured ??
  input.bars.some(
    ({ line, proposals }) =>
      (line !== null && !isOneWhole(line)) || proposals.some(({ notes }) => !isOneWhole(notes)),
  )

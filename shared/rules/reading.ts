import type { Exercise, Moment, Sounding } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'
import type { BarNotes, Line } from '@/shared/theory/note'
import { comparePitches, parsePitch, type Pitch, type PitchName } from '@/shared/theory/pitch'

/** Bars that are not read, by 1-based number: what remains is the reduction. */
export type SetAside = ReadonlySet<number>
const NONE_SET_ASIDE: SetAside = new Set()

/** One onset before it is known what comes after it. */
type Onset = { bar: number; place: number; note: Sounding; ticks: number; isHeld: boolean; isTied: boolean }

/** Every pitch that has been read, so that equal names give the same object. Three hundred or so exist. */
const knownPitches = new Map<PitchName, Pitch>()

/**
 * Reads a score into the moments of both voices: every onset of the line, with the cantus against it. First species
 * has one a bar. A tie makes the next onset held, not struck; a bar that is missing, empty or not filled up ends in an
 * unwritten moment.
 */
export function readMoments(
  exercise: Exercise,
  line: Line,
  setAside: SetAside = NONE_SET_ASIDE,
): readonly Moment[] {
  const onsets = readOnsets(exercise.cantus.length, (bar) => line[bar], setAside)
  return momentsOf(onsets, (bar) => exercise.cantus[bar - 1] as Pitch)
}

/**
 * Reads two added lines with the cantus, note against note: one moment a bar, with the note that each line begins it
 * with. That each bar holds one note is the matter of the rhythm's own rule.
 */
export function readTrio(
  exercise: Exercise,
  [line, second]: readonly [Line, Line],
  setAside: SetAside = NONE_SET_ASIDE,
): readonly Moment[] {
  const others = readMoments(exercise, firstNotes(second), setAside)
  return readMoments(exercise, firstNotes(line), setAside).map((moment, index) => ({
    ...moment,
    third: (others[index] as Moment).note,
  }))
}

const firstNotes = (line: Line): Line =>
  Object.fromEntries(
    Object.entries(line as Record<string, BarNotes>)
      .filter(([, notes]) => notes.length > 0)
      .map(([bar, [first]]) => [bar, [{ pitch: (first as BarNotes[number]).pitch, ticks: WHOLE_TICKS }]]),
  )

/** Reads one voice alone: its own notes, rests and gaps, a tied note counting once with its whole length. */
export function readVoice(
  barCount: number,
  line: Line,
  setAside: SetAside = NONE_SET_ASIDE,
): readonly Moment[] {
  const struck: Onset[] = []
  for (const onset of readOnsets(barCount, (bar) => line[bar], setAside)) {
    const last = struck.at(-1)
    if (onset.isHeld && last) last.ticks += onset.ticks
    else struck.push(onset)
  }
  return momentsOf(struck, () => null)
}

/** Reads the cantus alone: one whole note a bar. */
export function readCantus(cantus: readonly Pitch[]): readonly Moment[] {
  const onsets = cantus.map((note, index): Onset => {
    return { bar: index + 1, place: 0, note, ticks: WHOLE_TICKS, isHeld: false, isTied: false }
  })
  return momentsOf(onsets, () => null)
}

/** True when nothing in the reading is unwritten. */
export const isWhollyWritten = (moments: readonly Moment[]): boolean =>
  moments.every(({ note }) => note !== null)

function readOnsets(
  barCount: number,
  notesOf: (bar: number) => BarNotes | undefined,
  setAside: SetAside,
): Onset[] {
  const onsets: Onset[] = []
  for (let bar = 1; bar <= barCount; bar += 1) {
    if (setAside.has(bar)) continue
    const notes = notesOf(bar) ?? []
    let place = notes.length === 0 ? holdOver(onsets, bar) : 0
    for (const written of notes) {
      const note = written.pitch === null ? 'rest' : pitchNamed(written.pitch)
      const before = onsets.at(-1)
      // A tie out of a bar that is set aside is not read: its note then counts as struck.
      const isNeighbour = before !== undefined && (before.bar === bar || before.bar === bar - 1)
      const isHeld = isNeighbour && before.isTied && before.note === note
      onsets.push({ bar, place, note, ticks: written.ticks, isHeld, isTied: written.tied === true })
      place += written.ticks
    }
    if (place < WHOLE_TICKS) {
      onsets.push({ bar, place, note: null, ticks: 0, isHeld: false, isTied: false })
    }
  }
  return onsets
}

/**
 * Where a note is longer than its bar has room and the next bar is empty, it sounds on there: the cantus moves under it,
 * and rules have to see that. Returns the ticks that it fills.
 */
function holdOver(onsets: Onset[], bar: number): number {
  const last = onsets.at(-1)
  if (last === undefined || last.bar !== bar - 1 || last.note === null || last.note === 'rest') return 0
  const beyond = last.place + last.ticks - WHOLE_TICKS
  if (beyond <= 0 || last.place >= WHOLE_TICKS) return 0
  last.ticks -= beyond
  onsets.push({ bar, place: 0, note: last.note, ticks: beyond, isHeld: true, isTied: false })
  return beyond
}

function momentsOf(onsets: readonly Onset[], otherAt: (bar: number) => Pitch | null): Moment[] {
  const moments = new Array<Moment>(onsets.length)
  const last = onsets.length - 1
  let heldTicks = 0
  for (let index = last; index >= 0; index -= 1) {
    const onset = onsets[index] as Onset
    const soundingTicks = onset.ticks + heldTicks
    heldTicks = onset.isHeld ? soundingTicks : 0
    const isNextToLast = index === last - 1
    moments[index] = momentOf(onset, otherAt(onset.bar), soundingTicks, index, isNextToLast, index === last)
  }
  return moments
}

/** One onset as rules see it, for readings and for whoever makes moments one at a time. */
export function momentOf(
  { bar, place, note, isHeld }: Readonly<Pick<Onset, 'bar' | 'place' | 'note' | 'isHeld'>>,
  other: Pitch | null,
  ticks: number,
  index: number,
  isPenultimate: boolean,
  isLast: boolean,
): Moment {
  const isSonority = other !== null && note !== null && note !== 'rest'
  const order = isSonority && comparePitches(note, other) < 0 ? -1 : 1
  const steps = isSonority ? order * stepsFrom(other, note) : 0
  const semitones = isSonority ? order * semitonesFrom(other, note) : 0
  const octaves = Math.floor(steps / 7)
  return {
    bar,
    index,
    place,
    note,
    other,
    steps,
    semitones,
    simpleSteps: steps - 7 * octaves,
    simpleSemitones: semitones - 12 * octaves,
    isStruck: !isHeld,
    ticks,
    isFirst: index === 0,
    isPenultimate,
    isLast,
  }
}

/** The pitch of a name; what is no pitch counts as unwritten, as readers of documents ignore what does not parse. */
function pitchNamed(name: PitchName): Pitch | null {
  const known = knownPitches.get(name)
  if (known) return known
  const parsed = parsePitch(name)
  if (!parsed.ok) return null
  knownPitches.set(name, parsed.value)
  return parsed.value
}

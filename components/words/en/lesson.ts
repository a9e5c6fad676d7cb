import type { BarMotion } from '@/shared/notation/score-input'
import type { Letter, Pitch } from '@/shared/theory/pitch'

const COUNTS = [
  'none', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve', 'thirteen',
  'fourteen', 'fifteen', 'sixteen', 'seventeen', 'eighteen', 'nineteen', 'twenty',
] as const // prettier-ignore

const ACCIDENTALS: Readonly<Record<Pitch['alteration'], string>> = {
  [-2]: ' double flat',
  [-1]: ' flat',
  0: '',
  1: ' sharp',
  2: ' double sharp',
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

/** A list as a sentence has it: `a`, `a and b`, `a, b and c`. */
const listed = (parts: readonly string[]): string =>
  parts.length < 2 ? (parts[0] ?? '') : `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}`

/** Runs of bars as `6–8` or `6 to 8`. */
const runs = (bars: readonly number[], join: string): readonly string[] => {
  const parts: [number, number][] = []
  for (const bar of bars) {
    const last = parts.at(-1)
    if (last && last[1] === bar - 1) last[1] = bar
    else parts.push([bar, bar])
  }
  return parts.map(([from, to]) => (from === to ? String(from) : `${from}${join}${to}`))
}

const inWords = (count: number): string => COUNTS[count] ?? String(count)

/** What is said of a score in a lesson, the same on wall, lectern and desk. */
export const lesson = {
  /** `nine`, and figures past twenty. */
  inWords,
  listed,
  /** `Bars 6–7`, for headings and margins. */
  barsHeading: (bars: readonly number[]) =>
    `${bars.length === 1 ? 'Bar' : 'Bars'} ${listed(runs(bars, '–'))}`,
  /** `bars 6 to 8`, within a sentence. */
  barsInSentence: (bars: readonly number[]) =>
    `${bars.length === 1 ? 'bar' : 'bars'} ${listed(runs(bars, ' to '))}`,
  /** `6–8`, on a button. */
  barsShort: (bars: readonly number[]) => runs(bars, '–').join(', '),
  position: { above: 'counterpoint above', below: 'counterpoint below' },
  species: {
    1: 'first species',
    2: 'second species',
    3: 'third species',
    4: 'fourth species',
    5: 'fifth species',
  },
  mode: {
    ionian: 'Ionian',
    dorian: 'Dorian',
    phrygian: 'Phrygian',
    lydian: 'Lydian',
    mixolydian: 'Mixolydian',
    aeolian: 'Aeolian',
  },
  clef: {
    treble: 'treble',
    'treble-8vb': 'treble, an octave lower',
    alto: 'alto',
    tenor: 'tenor',
    bass: 'bass',
  },
  motion: {
    contrary: 'contrary motion',
    oblique: 'oblique motion',
    similar: 'similar motion',
    parallel: 'parallel motion',
  } satisfies Record<BarMotion, string>,
  /** `F sharp`, as it is spoken. */
  pitchSpoken: ({ letter, alteration }: { letter: Letter; alteration: Pitch['alteration'] }) =>
    letter + ACCIDENTALS[alteration],
  /** `F♯`, as it is printed. */
  pitchPrinted: ({ letter, alteration }: { letter: Letter; alteration: Pitch['alteration'] }) =>
    letter + { [-2]: '𝄫', [-1]: '♭', 0: '', 1: '♯', 2: '𝄪' }[alteration],
  breach: 'breach',
  remark: 'remark',
  noFinding: 'No finding.',
  /** `Nine of you: both voices rise into a fifth.` */
  ofYou: (count: number, sentence: string) =>
    `${capital(inWords(count))} of you: ${sentence.charAt(0).toLowerCase()}${sentence.slice(1)}`,
  setAsideRubric: (count: number) =>
    count === 1
      ? 'Set aside. The score is read, checked and played without it.'
      : 'Set aside. The score is read, checked and played without them.',
  /** How a screen reader is told one sounding of the score. */
  soundingSpoken: (facts: {
    bar: number
    pitch: string
    interval: string
    cantus: string
    isAbove: boolean
    isUnison: boolean
    motion: string | null
    findings: readonly string[] | null
  }) => {
    const relation = facts.isUnison
      ? `unison with ${facts.cantus}`
      : `${facts.interval} ${facts.isAbove ? 'above' : 'below'} ${facts.cantus}`
    const first = [`bar ${facts.bar}`, facts.pitch, relation, ...(facts.motion ? [facts.motion] : [])].join(
      ', ',
    )
    if (facts.findings === null) return `${first}.`
    return facts.findings.length === 0 ? `${first}; no finding.` : `${first}; ${facts.findings.join('; ')}`
  },
  /** One bar of the score for a screen reader, where nothing has been written over the cantus. */
  unwrittenSpoken: (bar: number, cantus: string) => `bar ${bar}, cantus ${cantus}, nothing written.`,
  setAsideSpoken: (bar: number) => `bar ${bar}, set aside.`,
  stateSpoken: { released: 'released', frozen: 'frozen', plain: '' },
  connection: {
    connecting: 'connecting',
    live: 'live',
    offline:
      'Out of touch with the lesson. What you write is kept on this device and sent when the connection is back.',
    offlineTeacher: 'Out of touch with the lesson. What you change is sent when the connection is back.',
    closed: 'The connection is closed.',
  },
  hindrance: {
    database:
      'The school’s server cannot keep anything just now. What is written stays on this device and is sent when it can.',
    'disk-full':
      'The school’s server has no room left to keep anything. What is written stays on this device; reading goes on.',
  },
  loading: 'The lesson is coming up.',
  here: (count: number) => `${count} here`,
  hands: (count: number) => (count === 1 ? '1 hand' : `${count} hands`),
  ended: 'The lesson has ended.',
  closedBecause: {
    'lesson-ended': 'The teacher has ended the lesson. What was written is kept.',
    removed: 'The teacher has taken you out of this lesson.',
    'signed-out': 'You are no longer signed in. Sign in again to come back; what you wrote is kept.',
    forbidden: 'You have no place in this lesson.',
    'not-found': 'There is no such lesson.',
    'lesson-full': 'The lesson is full. Ask the teacher to make room.',
    'too-large':
      'This device sent more than a sheet can hold, and the connection was closed. Reload the page to go on.',
    'too-fast': 'This device sent too much at once, and the connection was closed. Reload the page to go on.',
    malformed:
      'This device sent something that cannot be read, and the connection was closed. Reload the page to go on.',
    'bad-request': 'This page is not one the lesson knows. Reload it to go on.',
    other: 'The connection was closed. Reload the page to come back.',
  },
}

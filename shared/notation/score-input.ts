import type { Clef } from '@/shared/theory/clef'
import type { BarNotes } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'

export type BarMotion = 'contrary' | 'oblique' | 'similar' | 'parallel'

/** How a thing is inked: which token of the palette, by meaning. */
export type Tone = 'cantus' | 'line' | 'breach' | 'remark' | 'quiet'

/** A proposal standing in a bar, drawn as a hollow lozenge (filled when it breaks a law). */
export type ProposalMark = Readonly<{
  notes: BarNotes
  /** How many proposed it; null on a phone's own proposal, which carries no number. */
  count: number | null
  tone: 'line' | 'breach' | 'remark'
}>

export type ScoreBar = Readonly<{
  number: number
  state: 'released' | 'frozen' | 'plain'
  isSetAside: boolean
  cantus: PitchName | null
  /** The agreed line, drawn as solid noteheads. */
  line: BarNotes | null
  proposals: readonly ProposalMark[]
  /** Figured interval of the simultaneity, such as `5` or `10`, for the rail. */
  figure: Readonly<{ text: string; tone: Tone }> | null
  /** Figures of what sounds later in the bar, in order, each at its place in ticks; smaller than the first. */
  laterFigures?: readonly Readonly<{ tick: number; text: string; tone: Tone }>[] | undefined
  /** Motion into this bar from the one before it in the reading. */
  motion: BarMotion | null
  /** A degree, letter or sight-singing syllable under the cantus. */
  label: string | null
}>

/** A finding tied to the score: an arc over the bars it points at, or a lozenge when it is a single bar. */
export type ScoreArc = Readonly<{ id: string; fromBar: number; toBar: number; tone: 'breach' | 'remark' }>

export type ScoreBracket = Readonly<{ fromBar: number; toBar: number; label: string }>

/** Everything the engraver needs to draw an exercise; nothing of where it came from. */
export type ScoreInput = Readonly<{
  /** From the top staff downwards: with the counterpoint below, the cantus has the upper staff. `null` line clef: cantus alone. */
  position: 'above' | 'below'
  clefs: Readonly<{ cantus: Clef; line: Clef | null }>
  /** Sharps (positive) or flats (negative). */
  signature: number
  bars: readonly ScoreBar[]
  arcs: readonly ScoreArc[]
  brackets: readonly ScoreBracket[]
  /**
   * Whether notes of several values are told apart, as from the second species on: bars then begin at their left, there is a
   * metre, and a solid lozenge is a short note, not a breach. Left out: as the notes are.
   */
  isMeasured?: boolean | undefined
}>

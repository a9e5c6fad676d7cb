import type { z } from 'zod'
import type { Mode } from '@/shared/theory/mode'
import type { Pitch, PitchClass } from '@/shared/theory/pitch'

/** The catalogue's stable name of a rule: its file's name, its page, its key in rule sets. */
export type RuleId = string

/** `law`: a breach is an error. `preference`: a remark, a matter of taste. `off`: not looked at. */
export type Level = 'law' | 'preference' | 'off'

export type Species = 1 | 2 | 3 | 4 | 5
export type Position = 'above' | 'below'

/** All that a rule may know beside the notes themselves. */
export type Exercise = Readonly<{
  cantus: readonly Pitch[]
  mode: Mode
  final: PitchClass
  species: Species
  position: Position
}>

/**
 * Which reading a rule folds over. `melody`: one voice alone, the cantus or the added line. `cantus`: the cantus alone.
 * `line`: the added line alone. `pair`: both voices together. `trio`: two added lines with the cantus, note against note.
 */
export type Scope = 'melody' | 'cantus' | 'line' | 'pair' | 'trio'

/** What stands in the judged voice at a moment: a pitch, a rest, or `null` when nothing has been written yet. */
export type Sounding = Pitch | 'rest' | null

/**
 * One onset of the score as a rule sees it. In a reading of one voice `other` is always `null`.
 * `isFirst` and `isLast` speak of the reading: bars set aside are not in it.
 */
export type Moment = Readonly<{
  /** 1-based number of the bar in the score. */
  bar: number
  /** Place among the moments of the reading, from 0. */
  index: number
  /** Ticks from the start of the bar. */
  place: number
  /** The judged voice: the line, or the cantus in a reading of the cantus alone. */
  note: Sounding
  /** The cantus under or over it, in a reading of both voices. */
  other: Pitch | null
  /** The second added line, in a reading of three voices. */
  third?: Sounding
  /**
   * The interval between the voices, whichever is the higher, in letters and semitones, and again without its octaves.
   * Worked out once, as most rules of two voices ask for it; 0 where they do not both sound.
   */
  steps: number
  semitones: number
  simpleSteps: number
  simpleSemitones: number
  /** False when the note is held over from the moment before. */
  isStruck: boolean
  /** Sounding length from this onset, in ticks; 0 when unwritten. */
  ticks: number
  isFirst: boolean
  isPenultimate: boolean
  isLast: boolean
}>

/** `second`: the other added line, where there are three voices. */
export type Voice = 'cantus' | 'line' | 'second'

/** What a rule has to say: which message, where, and the facts that the words are filled with. */
export type Breach = Readonly<{
  /** Key of the sentence in the rule's words, such as `similar-into-fifth`. */
  code: string
  /** 1-based bars it points at, ascending. */
  bars: readonly number[]
  /** The notes it points at, for highlighting. */
  notes: readonly Readonly<{ voice: Voice; bar: number; place: number }>[]
  /** Values for the placeholders of the sentence: numbers, pitch names, interval names. */
  args: Readonly<Record<string, string | number>>
  /**
   * Said as a preference whatever the level of the rule, where a source sets a limit and advises a narrower one
   * (voices within a twelfth, rather within a tenth). A search of the laws passes over it.
   */
  isRemark?: true
}>

/** A breach of a law or a remark on a preference, as data. Words come from the locale table. */
export type Finding = Breach & Readonly<{ ruleId: RuleId; level: Exclude<Level, 'off'>; voice: Voice }>

export type Step<State> = Readonly<{ state: State; breach: Breach | null }>

/** Where a statement comes from: a key of the source table, and the place in it. */
export type Citation = Readonly<{ source: string; place?: string; fromMemory?: true }>

/**
 * A tiny score in words: bars parted by spaces, `.` for an unwritten bar, `D4` for a whole note. Other values are
 * written in quarters and joined by commas: `r:2,D4:2~` is a half rest and a half note tied into the next bar.
 */
export type Example = Readonly<{
  cantus: string
  line?: string
  /** The other added line, for a rule of three voices. */
  second?: string
  position?: Position
  /** First species when left out. */
  species?: Species
  mode: Mode
  final: string
  /** Where the rule must speak: the last bar each breach points at, in order; empty for the right example. */
  breaches: readonly number[]
  params?: Readonly<Record<string, unknown>>
}>

/** What a student who asks "why?" is told. Sentences in plain words of the trade. */
export type Explanation = Readonly<{
  title: string
  statement: string
  why: string
  mends: string
  sources: readonly Citation[]
  right: Example
  wrong: Example
  /** Message code to sentence with `{placeholders}`. */
  messages: Readonly<Record<string, string>>
  /** Where the sources disagree, in a sentence. */
  disagreement?: string
}>

/**
 * A rule of counterpoint as a small automaton over moments. The checker collects what it reports; a search multiplies
 * the states of the laws and counts. Equal keys must mean equal futures.
 */
export type Rule<State, Params> = Readonly<{
  id: RuleId
  level: Exclude<Level, 'off'>
  scope: Scope
  species: ReadonlySet<Species>
  /** Zod schema of the parameters, every one with its default; `params.parse({})` gives the defaults. */
  params: z.ZodType<Params>
  start: (exercise: Exercise, params: Params, voice: Voice) => State
  /**
   * An unwritten moment (`note === null`) must lead to a state that says nothing which some way of filling it in would
   * undo: a rule of neighbouring notes forgets them, a rule of the whole compass may keep the extremes.
   */
  step: (state: State, moment: Moment, params: Params) => Step<State>
  /** Called once after the last moment. `isComplete` is false when any moment was unwritten. */
  finish: (state: State, params: Params, isComplete: boolean) => Breach | null
  /**
   * A whole number that stands for the state: equal keys mean breaches of equal codes at equal moments, whatever
   * follows. The bars that a breach points back at may differ.
   */
  key: (state: State) => number
  /**
   * How many moments back the state remembers, where that is bounded and nothing rests: 0 for a rule that judges each
   * moment by itself. Lets the checker stop early when only a few notes have changed. Left out: the whole line.
   */
  reach?: number
  /** Rules that are not asked in the species of this one while it is on: a licence that frees from them. */
  suspends?: ReadonlySet<RuleId>
  explain: Explanation
}>

/** A rule of any state and parameters, as the registry keeps it. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any -- the registry holds rules of unlike states
export type AnyRule = Rule<any, any>

/** One rule's place in a rule set. Parameters that are left out take the rule's defaults. */
export type RuleSetting = Readonly<{ level: Level; params?: Readonly<Record<string, unknown>> }>

/** A named choice of rules: what is law this term, what is taste. Pure data, stored and sent as JSON. */
export type RuleSet = Readonly<{
  id: string
  name: string
  rules: Readonly<Record<RuleId, RuleSetting>>
}>

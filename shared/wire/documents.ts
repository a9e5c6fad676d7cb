/**
 * The documents of a lesson: their names, their root maps, and the schema of every value. The unit of permission is
 * the document; root maps are flat (`bar` or `bar:member` to a small plain JSON value). Readers ignore what does not parse.
 */
import { z } from 'zod'
import { CLEFS } from '@/shared/theory/clef'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { MODES } from '@/shared/theory/mode'

export const MAX_BARS = 40
export const MIN_BARS = 3
export const MAX_NOTES_A_BAR = 16
export const MAX_PROMPT_CHARACTERS = 280
export const MAX_LABEL_CHARACTERS = 60

export const pitchNameSchema = z.string().regex(/^[A-G](##|#|bb|b)?[0-8]$/)
export const pitchClassNameSchema = z.string().regex(/^[A-G](##|#|bb|b)?$/)

export const noteSchema = z.strictObject({
  pitch: pitchNameSchema.nullable(),
  ticks: z.int().min(1).max(WHOLE_TICKS),
  tied: z.literal(true).optional(),
})

export const barNotesSchema = z.array(noteSchema).min(1).max(MAX_NOTES_A_BAR)

export const ruleSettingSchema = z.strictObject({
  level: z.enum(['law', 'preference', 'off']),
  params: z.record(z.string().max(60), z.json()).optional(),
})

export const ruleSetSchema = z.strictObject({
  id: z.string().min(1).max(60),
  name: z.string().min(1).max(80),
  rules: z.record(z.string().max(60), ruleSettingSchema),
})

/** What is to be solved. Key `value` of the board's root map `exercise`. */
export const exerciseSchema = z.strictObject({
  title: z.string().min(1).max(120),
  cantus: z.array(pitchNameSchema).min(MIN_BARS).max(MAX_BARS),
  mode: z.enum(MODES),
  final: pitchClassNameSchema,
  species: z.union([z.literal(1), z.literal(2), z.literal(3), z.literal(4), z.literal(5)]),
  position: z.enum(['above', 'below']),
  clefs: z.strictObject({ cantus: z.enum(CLEFS), line: z.enum(CLEFS) }),
  /** Sharps (positive) or flats (negative) at the clef. */
  signature: z.int().min(-7).max(7),
  ruleSet: ruleSetSchema,
})
export type BoardExercise = z.infer<typeof exerciseSchema>

/** State of one bar. Key: bar number, in the board's root map `bars`. A missing bar is frozen, round 1, not set aside. */
export const barStateSchema = z.strictObject({
  state: z.enum(['released', 'frozen']),
  setAside: z.boolean(),
  /** Counts the times the room was cleared for this bar: a proposal belongs to the round it was made in. */
  round: z.int().min(1).max(10_000),
})
export type BarState = z.infer<typeof barStateSchema>

/** What the class agreed on. Key: bar number, in the board's root map `line`. */
export const adoptedBarSchema = z.strictObject({ notes: barNotesSchema })
export type AdoptedBar = z.infer<typeof adoptedBarSchema>

/** A span of bars with a name, bracketed under the score. Key: an id, in the board's root map `gestures`. */
export const gestureSchema = z.strictObject({
  from: z.int().min(1).max(MAX_BARS),
  to: z.int().min(1).max(MAX_BARS),
  label: z.string().max(MAX_LABEL_CHARACTERS),
})
export type Gesture = z.infer<typeof gestureSchema>

/** What the class is to do now and what may be seen. Key `value` of the board's root map `stage`. */
export const stageSchema = z.strictObject({
  prompt: z.string().max(MAX_PROMPT_CHARACTERS),
  /** Whether phones are told the findings on their own proposals. */
  showsFindings: z.boolean(),
  /** Whether the room's anonymous spread is on the board, for wall and phones. */
  showsSpread: z.boolean(),
  /** Whether the wall names who proposed. */
  showsNames: z.boolean(),
  /** Who is told how many ways there are to finish; the lectern always is. Boards written before there were any say nobody. */
  showsWays: z.enum(['nobody', 'wall', 'everyone']).default('nobody'),
})
export type StageSettings = z.infer<typeof stageSchema>

/** The room's proposals for a bar, without names. Key: bar number, in the board's root map `spread`; server-written. */
export const spreadSchema = z.array(
  z.strictObject({ notes: barNotesSchema, count: z.int().min(1).max(10_000) }),
)
export type Spread = z.infer<typeof spreadSchema>

/** A member's own notes for one bar. Key: bar number, in the sheet's root map `notes`. */
export const sheetBarSchema = z.strictObject({
  notes: barNotesSchema,
  /** Round of the bar when it was written; in an older round it is a draft. */
  round: z.int().min(1).max(10_000),
})
export type SheetBar = z.infer<typeof sheetBarSchema>

/** A member's own marks. Key: `kind:bar`, in the sheet's root map `marks`. */
export const markSchema = z.strictObject({
  kind: z.enum(['apex', 'gesture-edge', 'weak']),
  bar: z.int().min(1).max(MAX_BARS),
})
export type Mark = z.infer<typeof markSchema>

/** A member's standing proposal. Key: `bar:member`, in the chorus's root map `proposals`; the server alone writes. */
export const chorusProposalSchema = z.strictObject({ notes: barNotesSchema, round: z.int().min(1) })
export type ChorusProposal = z.infer<typeof chorusProposalSchema>

/** Root maps of each document, with the schema of their values. */
export const DOCUMENT_MAPS = {
  board: {
    exercise: exerciseSchema,
    bars: barStateSchema,
    line: adoptedBarSchema,
    gestures: gestureSchema,
    stage: stageSchema,
    spread: spreadSchema,
  },
  sheet: { notes: sheetBarSchema, marks: markSchema },
  chorus: { proposals: chorusProposalSchema },
} as const

export type DocumentKind = keyof typeof DOCUMENT_MAPS

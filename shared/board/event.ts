import { z } from 'zod'
import { barNotesSchema, exerciseSchema, gestureSchema, MAX_BARS, stageSchema } from '@/shared/wire/documents'

const bar = z.int().min(1).max(MAX_BARS)
const memberId = z.string().min(1).max(64)

/** What a change meant. Folding events gives the documents back; told to a class they are its replay. */
export const boardEventSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('board-laid'), exercise: exerciseSchema, stage: stageSchema }),
  z.strictObject({ kind: z.literal('exercise-changed'), exercise: exerciseSchema }),
  z.strictObject({ kind: z.literal('stage-changed'), stage: stageSchema }),
  z.strictObject({ kind: z.literal('bar-released'), bar }),
  z.strictObject({ kind: z.literal('bar-frozen'), bar }),
  z.strictObject({ kind: z.literal('bar-set-aside'), bar }),
  z.strictObject({ kind: z.literal('bar-taken-up'), bar }),
  z.strictObject({ kind: z.literal('room-cleared'), bar, round: z.int().min(1) }),
  z.strictObject({ kind: z.literal('adopted'), bar, notes: barNotesSchema }),
  z.strictObject({ kind: z.literal('taken-back'), bar }),
  z.strictObject({ kind: z.literal('gesture-drawn'), id: z.string(), gesture: gestureSchema }),
  z.strictObject({ kind: z.literal('gesture-erased'), id: z.string() }),
  z.strictObject({
    kind: z.literal('proposal-placed'),
    bar,
    memberId,
    notes: barNotesSchema,
    round: z.int().min(1),
  }),
  z.strictObject({ kind: z.literal('proposal-erased'), bar, memberId }),
])
export type BoardEvent = z.infer<typeof boardEventSchema>

/** An event with its place in the journal. The server stamps author and time. */
export type JournalEvent = Readonly<{ by: string | null; at: Date; event: BoardEvent }>

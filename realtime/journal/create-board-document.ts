import type { Transaction } from 'kysely'
import * as Y from 'yjs'
import { insertJournal } from '@/db/queries/journal'
import type { Database } from '@/db/schema'
import { SERVER_CLIENT_ID } from '@/realtime/document/limits'
import { createBoardState, deriveBoardEvents, writeBoardState } from '@/shared/board'
import type { BoardExercise, StageSettings } from '@/shared/wire/documents'

/** Lays the board of a new lesson, in the transaction that makes the lesson. `author` is nobody: no one is in it yet. */
export async function createBoardDocument(
  trx: Transaction<Database>,
  lessonId: string,
  exercise: BoardExercise,
  stage: StageSettings,
  at: Date = new Date(),
): Promise<void> {
  const doc = new Y.Doc()
  doc.clientID = SERVER_CLIENT_ID
  const state = createBoardState(exercise, stage)
  writeBoardState(doc, state)
  const bytes = Y.encodeStateAsUpdate(doc)
  const stamp = { lessonId, author: null, at }
  await insertJournal(
    trx,
    [{ ...stamp, document: 'board', ordinal: 1, bytes }],
    deriveBoardEvents(null, state).map((event) => ({ ...stamp, event })),
  )
  doc.destroy()
}

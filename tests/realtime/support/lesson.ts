import { createBoardDocument } from '@/realtime/journal/create-board-document'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { LessonRole } from '@/shared/api/lessons'
import type { BoardExercise, StageSettings } from '@/shared/wire/documents'

export const EXERCISE: BoardExercise = {
  title: 'Cantus in D',
  cantus: ['D4', 'F4', 'E4', 'D4', 'G4', 'F4', 'A4', 'G4', 'F4', 'E4', 'D4'],
  mode: 'dorian',
  final: 'D',
  species: 1,
  position: 'above',
  clefs: { cantus: 'treble', line: 'treble' },
  signature: 0,
  ruleSet: { id: 'test', name: 'Test', rules: {} },
}

export const STAGE: StageSettings = {
  prompt: 'The opening',
  showsFindings: true,
  showsSpread: false,
  showsNames: false,
  showsWays: 'nobody',
}

export type TestMember = Readonly<{
  memberId: string
  role: Exclude<LessonRole, 'wall'>
  name: string
  lessonId: string
}>

export type TestLesson = Readonly<{
  lessonId: string
  teacher: TestMember
  assistant: TestMember
  students: readonly TestMember[]
  guest: TestMember
}>

/** A lesson in the database, with a board, a teacher, an assistant, a guest and some students. */
export async function insertTestLesson(
  db: Connection,
  { students = 2, stage = STAGE }: { students?: number; stage?: StageSettings } = {},
): Promise<TestLesson> {
  const courseId = createId()
  const lessonId = createId()
  const member = (role: TestMember['role'], name: string): TestMember => ({
    memberId: createId(),
    role,
    name,
    lessonId,
  })
  const teacher = member('teacher', 'Ilse Marrow')
  const assistant = member('assistant', 'Teo Brandt')
  const guest = member('guest', 'Gast')
  const pupils = Array.from({ length: students }, (_, index) => member('student', `Student ${index + 1}`))
  await db.transaction().execute(async (trx) => {
    await trx.insertInto('course').values({ id: courseId, name: 'Counterpoint I' }).execute()
    await trx
      .insertInto('lesson')
      .values({ id: lessonId, courseId, title: 'Lesson', status: 'open', code: createId() })
      .execute()
    await trx
      .insertInto('lessonMember')
      .values(
        [teacher, assistant, guest, ...pupils].map(({ memberId, role, name }) => ({
          id: memberId,
          lessonId,
          name,
          role,
        })),
      )
      .execute()
    await createBoardDocument(trx, lessonId, EXERCISE, stage)
  })
  return { lessonId, teacher, assistant, students: pupils, guest }
}

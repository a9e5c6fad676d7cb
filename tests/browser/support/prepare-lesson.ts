import type { APIRequestContext } from 'playwright-core'
import { courses } from '@/shared/api/courses'
import { lessons, type Lesson } from '@/shared/api/lessons'
import { PRESETS } from '@/shared/rules'
import type { BoardExercise, StageSettings } from '@/shared/wire/documents'
import { ask } from './ask'

/** Fux's dorian cantus, eleven bars, with the counterpoint above. Over it he writes A A G A B C C B D C♯ D. */
export const EXERCISE: BoardExercise = {
  title: 'Cantus in D',
  cantus: ['D4', 'F4', 'E4', 'D4', 'G4', 'F4', 'A4', 'G4', 'F4', 'E4', 'D4'],
  mode: 'dorian',
  final: 'D',
  species: 1,
  position: 'above',
  clefs: { cantus: 'treble', line: 'treble' },
  signature: 0,
  ruleSet: PRESETS.find(({ id }) => id === 'open-undergrad') as BoardExercise['ruleSet'],
}

export const STAGE: StageSettings = {
  prompt: 'Bring the line home.',
  showsFindings: true,
  showsSpread: true,
  showsNames: false,
  showsWays: 'nobody',
}

/** Makes a lesson in the demo's course, as the teacher whose cookies `request` carries, and opens it. */
export async function openLesson(
  request: APIRequestContext,
  origin: string,
  title: string,
  stage: Partial<StageSettings> = {},
): Promise<Lesson & Readonly<{ code: string }>> {
  const { courses: own } = await ask(request, origin, courses.list)
  const course = own.find(({ myRole }) => myRole === 'teacher')
  if (!course) throw new Error('Whoever asks teaches no course.')
  const made = await ask(request, origin, lessons.create, {
    params: { courseId: course.id },
    body: { title, exercise: EXERCISE, stage: { ...STAGE, ...stage } },
  })
  const { lesson } = await ask(request, origin, lessons.open, { params: { lessonId: made.lesson.id } })
  if (!lesson.code) throw new Error('An open lesson has a code.')
  return { ...lesson, code: lesson.code }
}

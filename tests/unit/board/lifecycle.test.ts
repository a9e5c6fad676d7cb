import { stepLesson, type LessonLife, type LessonStep } from '@/shared/board'

const prepared: LessonLife = { status: 'prepared' }
const open: LessonLife = { status: 'open', isDoorOpen: true }
const shut: LessonLife = { status: 'open', isDoorOpen: false }
const ended: LessonLife = { status: 'ended' }

it.each<[LessonLife, LessonStep, LessonLife | string]>([
  [prepared, 'open', open],
  [prepared, 'end', 'not-open'],
  [prepared, 'open door', 'not-open'],
  [open, 'open', open],
  [shut, 'open', shut],
  [open, 'close door', shut],
  [shut, 'open door', open],
  [open, 'end', ended],
  [ended, 'end', ended],
  [ended, 'open', open],
  [ended, 'close door', 'ended'],
])('%j, %s: %j', (life, step, expected) => {
  const result = stepLesson(life, step)
  expect(result.ok ? result.value : result.reason).toEqual(expected)
})

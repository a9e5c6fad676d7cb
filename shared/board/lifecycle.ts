import { fail, ok, type Result } from '@/shared/result'

/** A lesson's life. The door lets newcomers in by the code; who is in may stay when it closes. */
export type LessonLife =
  | Readonly<{ status: 'prepared' }>
  | Readonly<{ status: 'open'; isDoorOpen: boolean }>
  | Readonly<{ status: 'ended' }>

export type LessonStep = 'open' | 'open door' | 'close door' | 'end'

/**
 * The lesson after a step. An ended lesson may be opened again (under a new code); a step that changes nothing is
 * allowed, so that two teachers who press at once both get what they asked for.
 */
export function stepLesson(life: LessonLife, step: LessonStep): Result<LessonLife, 'not-open' | 'ended'> {
  switch (step) {
    case 'open':
      return ok(life.status === 'open' ? life : { status: 'open', isDoorOpen: true })
    case 'open door':
    case 'close door':
      if (life.status === 'open') return ok({ status: 'open', isDoorOpen: step === 'open door' })
      return fail(life.status === 'ended' ? 'ended' : 'not-open')
    case 'end':
      return life.status === 'prepared' ? fail('not-open') : ok({ status: 'ended' })
  }
}

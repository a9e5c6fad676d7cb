import { randomInt } from 'node:crypto'
import { CODE_LENGTH, CODE_SYLLABLES } from '@/shared/api/lessons'

/** A code such as `re-fa-mi-la-sol-do`, every syllable drawn evenly. */
export const createLessonCode = (): string =>
  Array.from({ length: CODE_LENGTH }, () => CODE_SYLLABLES[randomInt(CODE_SYLLABLES.length)]).join('-')

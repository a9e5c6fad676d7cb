import { cantus } from './en/cantus'
import { courses } from './en/courses'
import { people } from './en/people'
import { account } from './en/account'
import { entry } from './en/entry'
import { common } from './en/common'
import { desk } from './en/desk'
import { errors } from './en/errors'
import { join } from './en/join'
import { lectern } from './en/lectern'
import { lesson } from './en/lesson'
import { ruleSets } from './en/rule-sets'
import { rules } from './en/rules'
import { score } from './en/score'
import { setup } from './en/setup'
import { sound } from './en/sound'
import { wall } from './en/wall'
import { ways } from './en/ways'

/** Every word of the interface, one typed table an area. */
const EN = {
  cantus,
  courses,
  people,
  account,
  entry,
  common,
  desk,
  errors,
  join,
  lectern,
  lesson,
  ruleSets,
  rules,
  score,
  setup,
  sound,
  wall,
  ways,
} as const

export type Words = typeof EN

/** The table of the reader's language. English is the only one so far. */
export const useWords = (): Words => EN

export { formatCount, formatDate, formatDateTime, formatList } from './format'

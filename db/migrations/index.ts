import type { Migration } from 'kysely'
import * as accounts from './001-accounts'
import * as courses from './002-courses'
import * as cantus from './003-cantus'
import * as lessons from './004-lessons'
import * as attempts from './005-attempts'
import * as journal from './006-journal'
import * as ruleSets from './007-rule-sets'

/** Every migration by name. Names sort in the order they run in; one that has shipped is never changed. */
export const MIGRATIONS: Readonly<Record<string, Migration>> = {
  '001-accounts': accounts,
  '002-courses': courses,
  '003-cantus': cantus,
  '004-lessons': lessons,
  '005-attempts': attempts,
  '006-journal': journal,
  '007-rule-sets': ruleSets,
}

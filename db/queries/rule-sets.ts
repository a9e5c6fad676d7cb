import type { Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { RuleSetTable } from '@/db/schema/rule-sets'
import type { RuleSetBody } from '@/shared/api/rule-sets'
import { readingOrder } from './search-text'

export const MAX_RULE_SETS_LISTED = 200

export type RuleSetRow = Selectable<RuleSetTable>

/** One's own, and what is shared with a course that one leads. */
const selectVisible = (db: Connection, userId: string) =>
  db
    .selectFrom('ruleSet')
    .selectAll()
    .where(({ eb, or, exists, selectFrom }) =>
      or([
        eb('ownerId', '=', userId),
        exists(
          selectFrom('courseMember')
            .select('userId')
            .whereRef('courseMember.courseId', '=', 'ruleSet.courseId')
            .where('courseMember.userId', '=', userId)
            .where('courseMember.role', 'in', ['teacher', 'assistant']),
        ),
      ]),
    )

export const listRuleSets = (db: Connection, userId: string): Promise<RuleSetRow[]> =>
  selectVisible(db, userId).orderBy(readingOrder('name')).orderBy('id').limit(MAX_RULE_SETS_LISTED).execute()

export const findRuleSet = (
  db: Connection,
  ruleSetId: string,
  userId: string,
): Promise<RuleSetRow | undefined> => selectVisible(db, userId).where('id', '=', ruleSetId).executeTakeFirst()

export const countOwnRuleSets = async (db: Connection, userId: string): Promise<number> => {
  const { count } = await db
    .selectFrom('ruleSet')
    .select(({ fn }) => fn.countAll<string>().as('count'))
    .where('ownerId', '=', userId)
    .executeTakeFirstOrThrow()
  return Number(count)
}

export const insertRuleSet = (
  db: Connection,
  ownerId: string,
  { rules, ...written }: RuleSetBody,
): Promise<RuleSetRow> =>
  db
    .insertInto('ruleSet')
    .values({ id: createId(), ownerId, rules: JSON.stringify(rules), ...written })
    .returningAll()
    .executeTakeFirstOrThrow()

export const updateRuleSet = (
  db: Connection,
  ruleSetId: string,
  { rules, ...written }: RuleSetBody,
): Promise<RuleSetRow> =>
  db
    .updateTable('ruleSet')
    .set({ rules: JSON.stringify(rules), ...written, updatedAt: new Date() })
    .where('id', '=', ruleSetId)
    .returningAll()
    .executeTakeFirstOrThrow()

export const deleteRuleSet = (db: Connection, ruleSetId: string) =>
  db.deleteFrom('ruleSet').where('id', '=', ruleSetId).execute()

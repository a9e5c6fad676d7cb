import { findCourseRole } from '@/db/queries/course-members'
import {
  countOwnRuleSets,
  deleteRuleSet,
  findRuleSet,
  insertRuleSet,
  listRuleSets,
  updateRuleSet,
  type RuleSetRow,
} from '@/db/queries/rule-sets'
import { accountOf, type Person } from '@/server/auth/asker'
import { assertTeaches } from '@/server/courses/assert-teaches'
import { found, Refused } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { ruleSetFieldProblems } from '@/server/rule-sets/rule-set-field-problems'
import { canInCourse } from '@/shared/api/course-acts'
import { ruleSets, type KeptRuleSet, type RuleSetBody, type RuleSetSummary } from '@/shared/api/rule-sets'
import { askerOf, type Context } from './context'

/** More than anybody teaches by; a stop to filling the table by script. */
const MOST_OWN_RULE_SETS = 100

const headOf = ({ id, name, basedOn, courseId, ownerId, updatedAt }: RuleSetRow, person: Person) => ({
  id,
  name,
  basedOn,
  courseId,
  isMine: ownerId === person.id,
  updatedAt: updatedAt.toISOString(),
})

const toRuleSet = (row: RuleSetRow, person: Person): KeptRuleSet => ({
  ...headOf(row, person),
  rules: row.rules,
})

function toSummary(row: RuleSetRow, person: Person): RuleSetSummary {
  const levels = Object.values(row.rules).map(({ level }) => level)
  const count = (wanted: string) => levels.filter((level) => level === wanted).length
  return { ...headOf(row, person), laws: count('law'), preferences: count('preference') }
}

export function createRuleSetRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db } = context

  async function assertWritten(person: Person, body: RuleSetBody): Promise<void> {
    const fields = [...ruleSetFieldProblems(body)]
    if (body.courseId !== null) {
      const role = await findCourseRole(db, body.courseId, person.id)
      if (!role || !canInCourse(role, 'share rule set'))
        fields.push({ path: 'courseId', code: 'not-an-option' })
    }
    if (fields.length > 0) throw new Refused('invalid', { fields })
  }

  async function keep(person: Person, body: RuleSetBody) {
    await assertTeaches(db, person)
    await assertWritten(person, body)
    if ((await countOwnRuleSets(db, person.id)) >= MOST_OWN_RULE_SETS) throw new Refused('conflict')
    return { ruleSet: toRuleSet(await insertRuleSet(db, person.id, body), person) }
  }

  async function ownRuleSet(person: Person, ruleSetId: string): Promise<RuleSetRow> {
    const row = found(await findRuleSet(db, ruleSetId, person.id))
    if (row.ownerId !== person.id) throw new Refused('forbidden')
    return row
  }

  on(ruleSets.list, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const rows = await listRuleSets(db, person.id)
    return { ruleSets: rows.map((row) => toSummary(row, person)) }
  })

  on(ruleSets.get, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    return { ruleSet: toRuleSet(found(await findRuleSet(db, asked.params.ruleSetId, person.id)), person) }
  })

  on(ruleSets.create, async (asked) => keep(accountOf(await askerOf(context, asked)), asked.body))

  on(ruleSets.import, async (asked) => {
    const { name, basedOn, rules } = asked.body
    return keep(accountOf(await askerOf(context, asked)), { name, basedOn, rules, courseId: null })
  })

  on(ruleSets.update, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { id } = await ownRuleSet(person, asked.params.ruleSetId)
    await assertWritten(person, asked.body)
    return { ruleSet: toRuleSet(await updateRuleSet(db, id, asked.body), person) }
  })

  on(ruleSets.remove, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { id } = await ownRuleSet(person, asked.params.ruleSetId)
    await deleteRuleSet(db, id)
    return {}
  })

  return router
}

import {
  countOwnCantus,
  deleteCantus,
  findCantus,
  insertCantus,
  listCantus,
  updateCantus,
  type CantusRow,
} from '@/db/queries/cantus'
import { findCourseRole } from '@/db/queries/course-members'
import { accountOf, type Person } from '@/server/auth/asker'
import { cantusProblems } from '@/server/cantus/cantus-problems'
import { assertTeaches } from '@/server/courses/assert-teaches'
import { found, Refused } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { cantus, type Cantus, type CantusBody } from '@/shared/api/cantus'
import { canInCourse } from '@/shared/api/course-acts'
import { askerOf, type Context } from './context'

/** More than anybody teaches; a stop to filling the table by script. */
const MOST_OWN_CANTUS = 400

const toCantus = ({ ownerId, createdAt: _, ...row }: CantusRow, person: Person): Cantus => ({
  ...row,
  isMine: ownerId === person.id,
})

export function createCantusRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db } = context

  async function assertWritten(person: Person, body: CantusBody): Promise<void> {
    const fields = [...cantusProblems(body)]
    if (body.courseId !== null) {
      const role = await findCourseRole(db, body.courseId, person.id)
      if (!role || !canInCourse(role, 'share cantus'))
        fields.push({ path: 'courseId', code: 'not-an-option' })
    }
    if (fields.length > 0) throw new Refused('invalid', { fields })
  }

  async function ownCantus(person: Person, cantusId: string): Promise<CantusRow> {
    const row = found(await findCantus(db, cantusId, person.id))
    if (row.ownerId !== person.id) throw new Refused('forbidden')
    return row
  }

  on(cantus.list, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const rows = await listCantus(db, person.id)
    return { cantus: rows.map((row) => toCantus(row, person)) }
  })

  on(cantus.get, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    return { cantus: toCantus(found(await findCantus(db, asked.params.cantusId, person.id)), person) }
  })

  on(cantus.create, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    await assertTeaches(db, person)
    await assertWritten(person, asked.body)
    if ((await countOwnCantus(db, person.id)) >= MOST_OWN_CANTUS) throw new Refused('conflict')
    return { cantus: toCantus(await insertCantus(db, person.id, asked.body), person) }
  })

  on(cantus.update, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { id } = await ownCantus(person, asked.params.cantusId)
    await assertWritten(person, asked.body)
    return { cantus: toCantus(await updateCantus(db, id, asked.body), person) }
  })

  on(cantus.remove, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { id } = await ownCantus(person, asked.params.cantusId)
    await deleteCantus(db, id)
    return {}
  })

  return router
}

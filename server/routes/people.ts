import { listPeople, updatePerson, type Person as PersonRow } from '@/db/queries/people'
import { accountOf, type Asker, type Person } from '@/server/auth/asker'
import { found, Refused } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { people } from '@/shared/api/people'
import { askerOf, type Context } from './context'

const toMe = (person: Person) => ({
  id: person.id,
  name: person.name,
  email: person.isGuest ? null : person.email,
  isVerified: person.isVerified,
  isGuest: person.isGuest,
  isAdministrator: person.isAdministrator,
  mayMakeCourses: person.mayMakeCourses || person.isAdministrator,
})

const toPerson = (row: PersonRow) => ({
  ...toMe({ ...row, isVerified: row.emailVerified, isGuest: row.isAnonymous === true, sessionId: '' }),
  mayMakeCourses: row.mayMakeCourses,
  createdAt: row.createdAt.toISOString(),
  courses: row.courses,
})

function assertAdministrator(asker: Asker): void {
  if (!accountOf(asker).isAdministrator) throw new Refused('forbidden')
}

export function createPeopleRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db, config } = context

  on(people.me, async (asked) => {
    const { person } = await askerOf(context, asked)
    return { me: person && toMe(person), isDemo: config.isDemo }
  })

  on(people.list, async (asked) => {
    assertAdministrator(await askerOf(context, asked))
    const page = await listPeople(db, asked.query)
    return { ...page, items: page.items.map(toPerson) }
  })

  on(people.update, async (asked) => {
    assertAdministrator(await askerOf(context, asked))
    return toPerson(found(await updatePerson(db, asked.params.userId, asked.body)))
  })

  return router
}

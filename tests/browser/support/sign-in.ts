import type { BrowserContext } from 'playwright-core'
import type { Person, School } from './school'

/** The first of the demo's people whose role is `role`, or the one of that name. */
export function findPerson(school: School, roleOrName: string): Person {
  const found = school.people.find(({ role, name }) => role === roleOrName || name === roleOrName)
  if (!found) throw new Error(`The demo has nobody who is ${roleOrName}.`)
  return found
}

/** Signs a device in by the API, which is quicker than the form; the form has tests of its own. */
export async function signIn(context: BrowserContext, school: School, person: Person): Promise<void> {
  const response = await context.request.post(`${school.origin}/api/auth/sign-in/email`, {
    data: { email: person.email, password: school.password },
    headers: { origin: school.origin },
  })
  if (!response.ok())
    throw new Error(`${person.name} was not signed in (${response.status()}): ${await response.text()}`)
}

import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { startCluster, type Cluster } from '@/db/cluster/start-cluster'
import { api } from '@/shared/api'
import { errorOf } from '@/tests/support/test-browser'
import { insertPerson, PASSWORD, signedIn } from '@/tests/support/test-people'
import { startTestServer } from '@/tests/support/test-server'

const POLL_MS = 20

/** Asks again and again until the answer is the one waited for. */
async function until<Value>(ask: () => Promise<Value>, isDone: (value: Value) => boolean): Promise<Value> {
  for (;;) {
    const value = await ask()
    if (isDone(value)) return value
    await new Promise((resolve) => setTimeout(resolve, POLL_MS))
  }
}

const serverPid = ({ dataDirectory }: Cluster) =>
  Number(readFileSync(path.join(dataDirectory, 'postmaster.pid'), 'utf8').split('\n')[0])

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0)
    return true
  } catch {
    return false
  }
}

describe('a database that goes away', () => {
  it('is told as such to everybody who asks, and served again when it is back, with all that was kept', async () => {
    const home = mkdtempSync(path.join(tmpdir(), 'bicinium-outage-'))
    const directory = path.join(home, 'postgres')
    const cluster = await startCluster(directory)
    const server = await startTestServer({}, { databaseServer: cluster.urlOf('postgres') })
    try {
      const teacher = await insertPerson(server.database.db, 'Ilse Marrow', { mayMakeCourses: true })
      const browser = await signedIn(server, teacher)
      const { course } = await browser.get(api.courses.create, { body: { name: 'Kept' } })

      const pid = serverPid(cluster)
      process.kill(pid, 'SIGKILL')
      await until(
        async () => isAlive(pid),
        (alive) => !alive,
      )
      const gone = await browser.ask(api.courses.get, { params: { courseId: course.id } })
      expect(gone.status).toBe(503)
      expect(errorOf(gone).code).toBe('unavailable')
      const signIn = await server.browser().signIn(teacher.email, PASSWORD)
      expect(signIn.status).toBe(503)
      // What needs no database goes on.
      expect((await server.browser().request('GET', '/')).status).toBe(200)
      expect((await server.browser().ask(api.people.me)).status).toBe(200)

      const again = await startCluster(directory)
      expect(again.wasStarted).toBe(true)
      expect(again.port).toBe(cluster.port)
      const back = await until(
        () => browser.ask(api.courses.get, { params: { courseId: course.id } }),
        ({ status }) => status !== 503,
      )
      expect(back.status).toBe(200)
    } catch (error) {
      // What follows needs the database, whatever went wrong.
      await startCluster(directory)
      throw error
    } finally {
      await server.close()
      await cluster.release()
      rmSync(home, { recursive: true, force: true })
    }
  })
})

import { LIBRARY, finalOf } from '@/db/library/upsert-library'
import { api } from '@/shared/api'
import { MAX_BARS } from '@/shared/wire/documents'
import { errorOf, type TestBrowser } from '@/tests/support/test-browser'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
let teacher: TestPerson
let leader: TestBrowser
const db = () => server.database.db

beforeAll(async () => {
  server = await startTestServer()
  teacher = await insertPerson(db(), 'Ilse Marrow', { mayMakeCourses: true })
  leader = await signedIn(server, teacher)
})
afterAll(() => server.close())

const melody = { title: 'Mine', notes: ['D4', 'F4', 'E4', 'D4'], mode: 'dorian', final: 'D', clef: 'treble' }

describe('the cantus library', () => {
  it('is there for everybody and nobody’s to change', async () => {
    const { cantus } = await leader.get(api.cantus.list)
    expect(cantus.map(({ id }) => id).sort()).toEqual(LIBRARY.map(({ id }) => id).sort())
    const published = cantus.filter(({ origin }) => origin === 'published')
    expect(published.map(({ final }) => final).sort()).toEqual(['A', 'C', 'D', 'E', 'F', 'G'])
    expect(published.every(({ source }) => source.includes('Gradus ad Parnassum'))).toBe(true)
    expect(cantus.filter(({ origin }) => origin === 'invented').length).toBeGreaterThanOrEqual(6)
    const params = { cantusId: 'library-fux-d' }
    expect((await leader.ask(api.cantus.remove, { params })).status).toBe(403)
    expect((await leader.ask(api.cantus.update, { params, body: melody })).status).toBe(403)
  })

  it('takes, changes, shares and gives up one’s own', async () => {
    const { cantus } = await leader.get(api.cantus.create, { body: { ...melody, source: 'By ear' } })
    expect(cantus).toMatchObject({ ...melody, origin: 'own', isMine: true, courseId: null, source: 'By ear' })
    const params = { cantusId: cantus.id }
    const assistant = await insertPerson(db(), 'Teo')
    const courseId = await insertCourseWith(db(), 'Shared', {
      [teacher.id]: 'teacher',
      [assistant.id]: 'assistant',
    })
    const helper = await signedIn(server, assistant)
    expect((await helper.ask(api.cantus.get, { params })).status).toBe(404)
    await leader.get(api.cantus.update, { params, body: { ...melody, title: 'Ours', courseId } })
    expect((await helper.get(api.cantus.get, { params })).cantus).toMatchObject({
      title: 'Ours',
      isMine: false,
    })
    expect((await helper.ask(api.cantus.update, { params, body: melody })).status).toBe(403)
    await leader.get(api.cantus.remove, { params })
    expect((await leader.ask(api.cantus.get, { params })).status).toBe(404)
  })

  it.each([
    ['too short', { notes: ['D4', 'D4'] }, { path: 'notes', code: 'too-short' }],
    ['too long', { notes: Array(MAX_BARS + 1).fill('D4') }, { path: 'notes', code: 'too-long' }],
    ['on a wrong final', { final: 'E' }, { path: 'final', code: 'wrong-final' }],
    ['on a final spelled otherwise', { final: 'C##' }, { path: 'final', code: 'wrong-final' }],
    ['above its clef', { notes: ['D4', 'D8', 'D4'] }, { path: 'notes.1', code: 'out-of-clef-range' }],
    ['below its clef', { notes: ['D4', 'C2', 'D4'] }, { path: 'notes.1', code: 'out-of-clef-range' }],
    ['not of notes', { notes: ['D4', 'H4', 'D4'] }, { path: 'notes.1' }],
    ['without a title', { title: ' ' }, { path: 'title', code: 'empty' }],
    ['with a title too long', { title: 'x'.repeat(121) }, { path: 'title', code: 'too-long' }],
    ['with hidden characters', { title: 'a\u202eb' }, { path: 'title', code: 'hidden-characters' }],
    ['in no mode', { mode: 'locrian' }, { path: 'mode', code: 'not-an-option' }],
    ['with something beside', { origin: 'published' }, { path: 'origin', code: 'unknown-key' }],
    [
      'for a course that is another’s',
      { courseId: 'abcdefgh1234' },
      { path: 'courseId', code: 'not-an-option' },
    ],
  ])('refuses one that is %s, and says which field', async (_what, change, problem) => {
    const answer = await leader.ask(api.cantus.create, { body: { ...melody, ...change } })
    expect(answer.status).toBe(422)
    expect(errorOf(answer).fields?.[0]).toMatchObject(problem)
  })

  it('names every final as its last note', () => {
    expect(LIBRARY.map(({ notes }) => finalOf(notes))).toEqual(
      expect.arrayContaining(['D', 'E', 'F', 'G', 'A', 'C']),
    )
  })
})

/** What goes wrong in a school: a phone out of reach, two tabs, a server that falls over. Nothing a student wrote is lost. */
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { desk as deskWords } from '@/components/words/en/desk'
import { lesson as lessonWords } from '@/components/words/en/lesson'
import { lessons } from '@/shared/api/lessons'
import { ask } from './support/ask'
import { keepLastPictures } from './support/keep-picture'
import { launchChromium } from './support/chromium'
import { layLine, type CutLine } from './support/cut-line'
import { deskFace, type DeskFace } from './support/desk-face'
import { lecternFace, type LecternFace } from './support/lectern-face'
import { openLesson } from './support/prepare-lesson'
import { findFreePort } from '@/db/cluster/find-free-port'
import { openSchool, type School } from './support/school'
import { openDevice } from './support/screens'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(90_000)

let school: School
let browser: Browser
let teacher: BrowserContext
/** The wire of the phones that will be out of reach. */
let line: CutLine

beforeAll(async () => {
  const linePort = await findFreePort()
  const environment = { ALLOWED_ORIGINS: `http://localhost:${linePort}` }
  ;[school, browser] = await Promise.all([openSchool(environment), launchChromium()])
  line = await layLine(Number(new URL(school.origin).port), linePort)
  teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
}, 120_000)

afterAll(async () => {
  await keepLastPictures(browser, 'faults')
  await browser?.close()
  await line?.close()
  await school?.close()
})

/** A guest's phone at its desk. */
async function enterAsGuest(
  code: string,
  name: string,
  origin: string = school.origin,
): Promise<{ context: BrowserContext; desk: DeskFace; lessonId: string }> {
  const context = await openDevice(browser, origin, 'phone')
  const { lessonId } = await ask(context.request, origin, lessons.join, { body: { code, name } })
  const page = await context.newPage()
  await page.goto(`/lessons/${lessonId}/desk`)
  return { context, desk: deskFace(page), lessonId }
}

/** An open lesson with bars 9 to 11 released, the lectern open on it. */
async function begin(title: string): Promise<{ lectern: LecternFace; code: string; lessonId: string }> {
  const { id, code } = await openLesson(teacher.request, school.origin, title)
  const page = await teacher.newPage()
  await page.goto(`/lessons/${id}/lectern`)
  const lectern = lecternFace(page)
  await lectern.release(9, 11)
  return { lectern, code, lessonId: id }
}

const isOn = (page: Page, bar: number, pitch: string) =>
  page.getByRole('radio', { name: new RegExp(`^bar ${bar}, ${pitch}\\b`), checked: true }).waitFor()

test('a phone out of reach says so, keeps what is written on it, and sends it when it is back', async () => {
  const { lectern, code } = await begin('Out of reach')
  const { desk } = await enterAsGuest(code, 'Mirela', line.origin)
  await desk.heading(deskWords.titleReleased([9, 10, 11]))

  await desk.sees(/\d+ here/)
  line.cut()
  await desk.sees(lessonWords.connection.offline)
  await desk.propose(9, 'D, major sixth above F')
  await desk.page.getByRole('status', { name: deskWords.keptSpoken.waiting }).waitFor()
  await lectern
    .room(9, 11)
    .getByText(/Nobody has offered/)
    .waitFor()

  line.mend()
  await desk.kept()
  await lectern.room(9, 11).getByText('Mirela').waitFor()
})

test('a phone that is closed before it could send finds its note again when it comes back', async () => {
  const { lectern, code, lessonId } = await begin('Closed before it could send')
  const { context, desk } = await enterAsGuest(code, 'Jun', line.origin)
  await desk.heading(deskWords.titleReleased([9, 10, 11]))
  await desk.sees(/\d+ here/)
  line.cut()
  await desk.sees(lessonWords.connection.offline)
  await desk.propose(10, 'B, fifth above E')
  await desk.page.close()

  line.mend()
  const page = await context.newPage()
  await page.goto(`/lessons/${lessonId}/desk`)
  const again = deskFace(page)
  await again.hold(10)
  await isOn(page, 10, 'B')
  await again.kept()
  await lectern.room(9, 11).getByText('Jun').waitFor()
})

test('two tabs of one phone write on one sheet', async () => {
  const { lectern, code, lessonId } = await begin('Two tabs')
  const { context, desk } = await enterAsGuest(code, 'Sofía')
  const other = await context.newPage()
  await other.goto(`/lessons/${lessonId}/desk`)
  const second = deskFace(other)
  await desk.propose(9, 'D, major sixth above F')
  await second.hold(9)
  await isOn(other, 9, 'D')
  await second.propose(9, 'A, major third above F')
  await isOn(desk.page, 9, 'A')
  await second.kept()
  const rows = lectern.room(9, 11).getByRole('listitem')
  await rows.filter({ hasText: 'Sofía' }).first().waitFor()
  expect(await rows.count()).toBe(1)
})

test('a server killed in the middle of a lesson comes back with everything it acknowledged', async () => {
  const { lectern, code } = await begin('A server falls over')
  const [first, second] = await Promise.all([enterAsGuest(code, 'Tomasz'), enterAsGuest(code, 'Annika')])
  await first.desk.propose(9, 'D, major sixth above F')
  await first.desk.kept()
  // A phone that has never been in the room has nothing to be out of touch with.
  await second.desk.sees(/\d+ here/)

  await school.kill()
  try {
    await second.desk.sees(lessonWords.connection.offline)
    await second.desk.propose(9, 'C, fifth above F')
    await second.desk.page.getByRole('status', { name: deskWords.keptSpoken.waiting }).waitFor()
  } finally {
    // Whatever went wrong, the tests that follow need the server.
    await school.restart()
  }

  await second.desk.kept()
  await first.desk.kept()
  const room = lectern.room(9, 11)
  await room.getByText('Tomasz').waitFor()
  await room.getByText('Annika').waitFor()
  expect(await room.getByRole('listitem').count()).toBe(2)
  // The lectern writes again too: what it does reaches the phones.
  await lectern.select(9, 11)
  await lectern.button('Freeze 9–11').click()
  await first.desk.heading(deskWords.titleNone)
})

test('a bar frozen while a phone was away keeps what was written as a draft, and the phone says so', async () => {
  const { lectern, code } = await begin('Frozen meanwhile')
  const { desk } = await enterAsGuest(code, 'Noor', line.origin)
  await desk.heading(deskWords.titleReleased([9, 10, 11]))
  await desk.sees(/\d+ here/)
  line.cut()
  await desk.sees(lessonWords.connection.offline)
  await desk.propose(9, 'D, major sixth above F')
  await lectern.button('Freeze 9–11').click()
  await lectern.button('Release 9–11').waitFor()

  line.mend()
  await desk.sees(deskWords.closed.draft('D'))
  await desk.kept()
  await lectern.button('Release 9–11').click()
  await lectern.room(9, 11).getByText('Noor').waitFor()
})

test('a member taken out of the lesson is told, and does not come back', async () => {
  const { lectern, code } = await begin('Taken out')
  const { desk, lessonId } = await enterAsGuest(code, 'Léon')
  await desk.heading(deskWords.titleReleased([9, 10, 11]))
  await lectern.button('Remove Léon from the lesson').click()
  await lectern.page.getByRole('dialog').getByRole('button', { name: 'Remove', exact: true }).click()
  await desk.sees(lessonWords.closedBecause.removed)
  await desk.page.goto(`/lessons/${lessonId}/desk`)
  await desk.page.getByRole('heading').first().waitFor()
  expect(await desk.ladder.count()).toBe(0)
})

test('an assistant leads as the teacher does, each seeing what the other did', async () => {
  const { lectern, lessonId, code } = await begin('Two leaders')
  const assistant = await openDevice(browser, school.origin, 'laptop')
  await signIn(assistant, school, findPerson(school, 'assistant'))
  const page = await assistant.newPage()
  await page.goto(`/lessons/${lessonId}/lectern`)
  const second = lecternFace(page)
  const { desk } = await enterAsGuest(code, 'Ifeoma')
  await desk.propose(9, 'D, major sixth above F')
  await second.room(9, 11).getByText('Ifeoma').waitFor()
  await second.select(9, 11)
  await second.button('Freeze 9–11').click()
  await lectern.button('Release 9–11').waitFor()
  await desk.sees(deskWords.closed.draft('D'))
})

test('a guest is in one lesson and nowhere else', async () => {
  const { code } = await begin('One lesson')
  const other = await begin('Another lesson')
  const { context, desk } = await enterAsGuest(code, 'Mirela')
  await desk.heading(deskWords.titleReleased([9, 10, 11]))
  for (const path of [
    `/lessons/${other.lessonId}/desk`,
    `/lessons/${other.lessonId}/wall`,
    '/cantus',
    '/people',
  ]) {
    const page = await context.newPage()
    await page.goto(path)
    await page.getByRole('heading').first().waitFor()
    expect(await page.getByRole('radiogroup', { name: /^Pitches for bar/ }).count()).toBe(0)
    expect(await page.getByText('Cantus in D').count()).toBe(0)
    await page.close()
  }
})

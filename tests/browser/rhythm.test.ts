/** A bar of fifth species, written on a phone as a student does who was not taught the tool: a rhythm, then its notes. */
import type { Browser, Page } from 'playwright-core'
import { desk as words } from '@/components/words/en/desk'
import { courses } from '@/shared/api/courses'
import { lessons } from '@/shared/api/lessons'
import { ask } from './support/ask'
import { launchChromium } from './support/chromium'
import { deskFace } from './support/desk-face'
import { keepLastPictures, keepPicture } from './support/keep-picture'
import { lecternFace } from './support/lectern-face'
import { EXERCISE, STAGE } from './support/prepare-lesson'
import { openSchool, type School } from './support/school'
import { openDevice } from './support/screens'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(60_000)

let school: School
let browser: Browser
let phone: Page
let board: Page

beforeAll(async () => {
  ;[school, browser] = await Promise.all([openSchool(), launchChromium()])
  const teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
  const { courses: own } = await ask(teacher.request, school.origin, courses.list)
  const made = await ask(teacher.request, school.origin, lessons.create, {
    params: { courseId: own.find(({ myRole }) => myRole === 'teacher')?.id as string },
    body: { title: 'A florid line', exercise: { ...EXERCISE, species: 5 }, stage: STAGE },
  })
  const { lesson } = await ask(teacher.request, school.origin, lessons.open, {
    params: { lessonId: made.lesson.id },
  })
  board = await teacher.newPage()
  await board.goto(`/lessons/${lesson.id}/lectern`)
  await lecternFace(board).release(4, 5)
  const guest = await openDevice(browser, school.origin, 'phone')
  await ask(guest.request, school.origin, lessons.join, {
    body: { code: lesson.code as string, name: 'Mirela' },
  })
  phone = await guest.newPage()
  await phone.goto(`/lessons/${lesson.id}/desk`)
}, 120_000)

afterAll(async () => {
  await keepLastPictures(browser, 'rhythm')
  await browser?.close()
  await school?.close()
})

const placeOf = (place: number) => phone.getByRole('radio', { name: new RegExp(`^${place}: `) })

test('a rhythm is chosen by its picture, and each tap on a pitch fills the next note', async () => {
  const desk = deskFace(phone)
  await desk.hold(4)
  await phone.getByRole('radio', { name: 'half note, quarter note, quarter note', exact: true }).click()
  for (const [place, pitch] of [
    [1, 'A'],
    [2, 'B'],
    [3, 'C'],
  ] as const) {
    await phone.getByRole('radio', { name: new RegExp(`^${place}: `), checked: true }).waitFor()
    await desk.rung(`bar 4, ${pitch}`).first().click()
  }
  await expect(placeOf(1).getAttribute('aria-label')).resolves.toMatch(/half note, A/)
  await desk.kept()
  await keepPicture(phone, 'rhythm-desk')
})

test('the bar goes to the class when it is whole, and comes off when a note is taken away', async () => {
  await lecternFace(board).sees('Not finished. Mirela')
  await keepPicture(board, 'rhythm-lectern')
  await phone.getByRole('button', { name: words.ladder.erase }).click()
  await phone.getByRole('radio', { name: /^3: quarter note, not written yet/, checked: true }).waitFor()
})

test('a note held over is already there in the next bar', async () => {
  const desk = deskFace(phone)
  await phone.getByRole('radio', { name: 'half note, half note held over', exact: true }).click()
  await phone.getByRole('radio', { name: /^2: half note, B/, checked: true }).waitFor()
  await desk.kept()
  await desk.hold(5)
  await phone.getByRole('radio', { name: /^1: half note, B/ }).waitFor()
  await phone.getByRole('radio', { name: /^2: half note, not written yet/, checked: true }).waitFor()
  await keepPicture(phone, 'rhythm-desk-held')
})

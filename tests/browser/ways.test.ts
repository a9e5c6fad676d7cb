/** Ways to finish, counted in a worker of each browser: the same figures on lectern, wall and phone as the search gives here. */
import type { Browser } from 'playwright-core'
import { formatCount } from '@/components/ways/format-ways'
import { ways as words } from '@/components/words/en/ways'
import { readExercise } from '@/shared/rules/exercise'
import { createSearch } from '@/shared/search'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { launchChromium } from './support/chromium'
import { deskFace } from './support/desk-face'
import { keepLastPictures, keepPicture } from './support/keep-picture'
import { lecternFace } from './support/lectern-face'
import { EXERCISE, openLesson } from './support/prepare-lesson'
import { openSchool, type School } from './support/school'
import { openDevice } from './support/screens'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(60_000)

const search = createSearch(readExercise(EXERCISE), EXERCISE.ruleSet)
const whole = (pitch: string) => [{ pitch, ticks: WHOLE_TICKS }]
const figureOf = (line: Parameters<typeof search.find>[0]) => formatCount(String(search.find(line).count))

let school: School
let browser: Browser

beforeAll(async () => {
  ;[school, browser] = await Promise.all([openSchool(), launchChromium()])
}, 120_000)

afterAll(async () => {
  await keepLastPictures(browser, 'ways')
  await browser?.close()
  await school?.close()
})

test('lectern, wall and phone tell the exact number of ways, and where a proposal is stuck', async () => {
  const teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
  const lesson = await openLesson(teacher.request, school.origin, 'Ways', { showsWays: 'everyone' })
  const lectern = lecternFace(await teacher.newPage())
  await lectern.page.goto(`/lessons/${lesson.id}/lectern`)
  const empty = figureOf({})
  await lectern.sees(words.ofLine(empty, false))

  const wall = await teacher.newPage()
  await wall.goto(`/lessons/${lesson.id}/wall`)
  await wall.getByText(words.toFinish(false)).waitFor()
  await wall.getByText(empty, { exact: true }).waitFor()

  await lectern.page.bringToFront()
  await lectern.release(11)
  const phone = await openDevice(browser, school.origin, 'phone')
  await signIn(phone, school, findPerson(school, 'student'))
  const desk = deskFace(await phone.newPage())
  await desk.page.goto(`/lessons/${lesson.id}/desk`)
  // Every rung tells its share, and the shares are all the ways there are.
  const last = search
    .find({})
    .alive()
    .find(({ bar }) => bar === 11)
  expect(last?.notes.length).toBeGreaterThan(0)
  for (const { pitch, count } of last?.notes ?? []) {
    const figure = words.onRung(formatCount(String(count)), count === 1n)
    const rung = desk.page.getByRole('radio', {
      name: new RegExp(`^bar 11, ${pitch?.slice(0, -1)}\\b.*; ${figure}$`),
    })
    await rung.first().waitFor()
  }
  await keepPicture(desk.page, 'ways-desk')

  // The line may not end on the fifth: whoever offers it leaves nothing.
  await desk.propose(11, 'A, fifth')
  const room = lectern.room(11, 11)
  expect(search.find({ line: { 11: whole('A4') } }).deadEnd?.bar).toBe(11)
  await room.getByText(words.stuckAt(11)).waitFor()
  await desk.propose(11, 'D, octave')
  await room.getByText(/ways left$/).waitFor()
  await keepPicture(lectern.page, 'ways-lectern')
})

/**
 * One lesson from beginning to end, as product.md tells it: prepared, proposed by gesture, heard, adopted and frozen,
 * with the teacher at the lectern, a wall on its own machine, and three phones. The tests follow each other in one room.
 */
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { desk as deskWords } from '@/components/words/en/desk'
import { join as joinWords } from '@/components/words/en/join'
import { lectern as words } from '@/components/words/en/lectern'
import { lesson as lessonWords } from '@/components/words/en/lesson'
import { setup as setupWords } from '@/components/words/en/setup'
import { wall as wallWords } from '@/components/words/en/wall'
import { courses } from '@/shared/api/courses'
import { ask } from './support/ask'
import { launchChromium } from './support/chromium'
import { deskFace, type DeskFace } from './support/desk-face'
import { eventually } from './support/eventually'
import { keepLastPictures, keepPicture } from './support/keep-picture'
import { lecternFace, type LecternFace } from './support/lectern-face'
import { openSchool, type School } from './support/school'
import { openDevice } from './support/screens'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(60_000)

let school: School
let browser: Browser
let teacher: BrowserContext
let lectern: LecternFace
let wall: Page
let phones: readonly [DeskFace, DeskFace, DeskFace]
let code = ''
const troubles: string[] = []

/** Whatever a page throws or its policy forbids is a failure, whoever was looking at the time. */
function watch(page: Page, who: string): Page {
  page.on('pageerror', (error) => troubles.push(`${who}: ${error.message}`))
  page.on('console', (message) => {
    const text = message.text()
    if (message.type() === 'error' && /Content Security Policy|Minified React error|Warning:/.test(text))
      troubles.push(`${who}: ${text}`)
  })
  return page
}

async function newPage(context: BrowserContext, who: string): Promise<Page> {
  return watch(await context.newPage(), who)
}

beforeAll(async () => {
  ;[school, browser] = await Promise.all([openSchool(), launchChromium()])
  teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
}, 120_000)

afterAll(async () => {
  await keepLastPictures(browser, 'lesson')
  await browser?.close()
  await school?.close()
})

test('a teacher prepares a lesson on a cantus of the library and opens it', async () => {
  const { courses: own } = await ask(teacher.request, school.origin, courses.list)
  const page = await newPage(teacher, 'lectern')
  await page.goto(`/courses/${own[0]?.id}/new-lesson`)
  await page.getByRole('button', { name: setupWords.create }).waitFor()
  await page
    .getByRole('radio', { name: /dorian|in D/i })
    .first()
    .check({ force: true })
  await page.getByLabel(setupWords.lessonTitle).fill('A second voice over the cantus in D')
  await page.getByRole('button', { name: setupWords.create }).click()
  await page.getByRole('heading', { level: 1, name: 'A second voice over the cantus in D' }).waitFor()
  await page.getByText(words.openLead).waitFor()
  await page.getByRole('button', { name: words.open, exact: true }).click()
  await page.getByRole('button', { name: words.end, exact: true }).waitFor()
  lectern = lecternFace(page)
})

test('the wall opens on its own machine by a link, and shows the way in', async () => {
  await lectern.button(words.wallHint).click()
  await lectern.button(words.wallLink).click()
  const address = await lectern.page.getByLabel(words.wallLink).inputValue()
  await lectern.page.keyboard.press('Escape')

  const projector = await openDevice(browser, school.origin, 'projector', { colorScheme: 'dark' })
  wall = await newPage(projector, 'wall')
  await wall.goto(address)
  await wall.getByText(wallWords.joinBySyllables).waitFor()
  const picture = wall.getByRole('img', { name: /^Square code/ })
  code = /opens the lesson (.+)$/.exec((await picture.getAttribute('aria-label')) ?? '')?.[1] ?? ''
  expect(code.split(' ')).toHaveLength(6)
  await keepPicture(wall, 'lesson-wall-waiting')
})

test('three phones come in: by tapped syllables, by typing them, and by the square on the wall', async () => {
  const devices = await Promise.all([0, 1, 2].map(() => openDevice(browser, school.origin, 'phone')))
  const [student, typing, scanning] = devices as [BrowserContext, BrowserContext, BrowserContext]
  await signIn(student, school, findPerson(school, 'student'))

  const first = await newPage(student, 'student')
  await first.goto('/join')
  for (const syllable of code.split(' ')) {
    await first.getByRole('button', { name: joinWords.syllableHint(syllable), exact: true }).click()
  }
  await first.getByRole('heading', { level: 1, name: deskWords.titleNone }).waitFor()

  const second = await newPage(typing, 'guest who types')
  await second.goto('/join')
  await second.getByRole('button', { name: joinWords.typeInstead }).click()
  await second.getByRole('textbox', { name: joinWords.typedLabel }).fill(code.toUpperCase())
  await second.getByRole('button', { name: joinWords.typedGo }).click()
  await second.getByRole('textbox', { name: joinWords.nameLabel, exact: true }).fill('Zoë Ångström')
  await second.getByRole('button', { name: joinWords.nameGo }).click()
  await second.getByRole('heading', { level: 1, name: deskWords.titleNone }).waitFor()

  const third = await newPage(scanning, 'guest who scans')
  await third.goto(`/join/${code.replaceAll(' ', '-')}`)
  await third.getByRole('textbox', { name: joinWords.nameLabel, exact: true }).fill('Ifeoma')
  await third.getByRole('textbox', { name: joinWords.nameLabel, exact: true }).press('Enter')
  await third.getByRole('heading', { level: 1, name: deskWords.titleNone }).waitFor()

  phones = [deskFace(first), deskFace(second), deskFace(third)]
  await lectern.sees('Ifeoma')
  await lectern.sees('Zoë Ångström')
})

test('released bars open on every phone and on the wall', async () => {
  await lectern.release(9, 11)
  for (const phone of phones) await phone.heading(deskWords.titleReleased([9, 10, 11]))
  await wall.getByText(wallWords.offered(true)).waitFor()
})

test('what a phone proposes is kept, and annotated at once on phone and lectern', async () => {
  const [first, second, third] = phones
  await first.propose(9, 'D, major sixth above F')
  await first.propose(10, 'C, minor sixth above E')
  await first.page.getByRole('button', { name: deskWords.settings.open }).click()
  await first.page.getByText(deskWords.ladder.accidentals).click()
  await first.page.keyboard.press('Escape')
  await first.propose(10, 'C sharp, major sixth above E')
  await first.propose(11, 'D, octave above D')
  await first.kept()

  await second.propose(9, 'C, fifth above F')
  await second.propose(10, 'B, fifth above E')
  await second.propose(11, 'A, fifth above D')
  await second.kept()
  // Parallel fifths: the rubric stands under the score of the phone that wrote them.
  await second.page
    .getByRole('status')
    .getByText(/^Bars 9–10/)
    .first()
    .waitFor()

  await third.propose(9, 'D, major sixth above F')
  await third.kept()

  const room = lectern.room(9, 11)
  await room.getByRole('listitem').nth(2).waitFor()
  const fifths = room.getByRole('listitem').filter({ hasText: 'Zoë Ångström' })
  await fifths
    .getByText(/^Bars 9–10/)
    .first()
    .waitFor()
  await room.getByText(words.room.begun).first().waitFor()
  await keepPicture(lectern.page, 'lesson-lectern')
  await keepPicture(second.page, 'lesson-desk-breach')
})

test('the wall shows how much of the room has answered, and nobody’s name', async () => {
  await wall.getByText(/^3\s*of 3$/).waitFor()
  await wall.getByRole('img', { name: /^bar 9, .*D by 2.*released/ }).waitFor()
  const text = await wall.locator('body').innerText()
  expect(text).not.toMatch(/Zoë|Ifeoma/)
  await keepPicture(wall, 'lesson-wall')
})

test('the wall has no control of the lesson: at most the one press that lets it sound, and its machine may ask for nothing else', async () => {
  const pressable = wall.locator('button, input, select, textarea, [role="button"]')
  // Whether the browser asks for that press depends on whether it takes the page to have been touched already.
  for (const label of await pressable.allInnerTexts()) expect(label).toBe(wallWords.letSound)
  await wall.mouse.click(4, 4)
  await wall.getByRole('button', { name: wallWords.letSound }).waitFor({ state: 'detached' })
  expect(await pressable.count()).toBe(0)
  for (const path of ['/api/courses', '/api/cantus', '/api/people']) {
    expect([401, 403]).toContain((await wall.request.get(school.origin + path)).status())
  }
})

test('phones are silent, and a proposal is heard at the lectern with a playhead', async () => {
  const room = lectern.room(9, 11)
  const row = room.getByRole('listitem').filter({ hasText: 'Zoë Ångström' })
  await row.getByRole('button', { name: /^Hear/ }).click()
  const playhead = lectern.page.locator('[data-playhead]').first()
  const barOf = async () => Number(await playhead.getAttribute('data-playhead'))
  const first = await eventually('the playhead', barOf, (bar) => bar >= 8)
  await eventually('the playhead going on', barOf, (bar) => bar > first)
  await row.getByText(words.stop, { exact: true }).click()
  await playhead.waitFor({ state: 'detached' })
  for (const phone of phones) expect(await phone.page.locator('[data-playhead]').count()).toBe(0)
})

test('what is adopted stands in every score, and its bars freeze', async () => {
  const row = lectern.room(9, 11).getByRole('listitem').filter({ hasText: 'C♯' })
  const named = findPerson(school, 'student').name
  const own = lectern.room(9, 11).getByRole('listitem').filter({ hasText: named })
  expect(await row.or(own).count()).toBeGreaterThan(0)
  await own.getByRole('button', { name: /^Adopt/ }).click()
  await lectern.sees(words.adopted([9, 10, 11]))
  for (const phone of phones) await phone.heading(deskWords.titleNone)
  await phones[1].sees(deskWords.closed.frozenAdopted('D'))
  await phones[1].sees(deskWords.closed.draft('A'))
  await wall.getByRole('img', { name: /^bar 10, cantus E, line C sharp, sixth.*frozen/ }).waitFor()
})

test('taken back and released again, a draft is offered again on its own phone', async () => {
  await lectern.button(words.undo).click()
  for (const phone of phones) await phone.heading(deskWords.titleReleased([9, 10, 11]))
  const [, second] = phones
  await second.hold(9)
  await second.page.getByRole('radio', { name: /^bar 9, C\b/, checked: true }).waitFor()
})

test('another round clears the room; what was there is offered to its own phone again', async () => {
  await lectern.select(9, 11)
  await lectern.button(words.clear).click()
  await lectern.button(words.clearGo).click()
  await lectern.sees(words.room.empty([9, 10, 11]))
  const [first, second] = phones
  await second.hold(9)
  await second.sees(deskWords.earlier('C'))
  await first.hold(9)
  await first.page.getByRole('button', { name: deskWords.offerAgain('D') }).click()
  await first.page.getByRole('radio', { name: /^bar 9, D\b/, checked: true }).waitFor()
  await lectern.room(9, 11).getByRole('listitem').first().waitFor()
  for (const bar of [10, 11]) {
    await first.hold(bar)
    await first.page.getByRole('button', { name: /^Propose .* again$/ }).click()
  }
  await first.kept()
  await lectern
    .room(9, 11)
    .getByRole('button', { name: /^Adopt/ })
    .first()
    .click()
  await phones[2].heading(deskWords.titleNone)
})

test('bars set aside fold away on every screen, and are taken up again', async () => {
  await lectern.select(2, 3)
  await lectern.button(words.setAside).click()
  await wall.getByRole('img', { name: 'bar 2, set aside' }).waitFor()
  await wall.getByText(lessonWords.setAsideRubric(2)).waitFor()
  await keepPicture(wall, 'lesson-wall-set-aside')
  await lectern.button(words.takeUp).click()
  await wall.getByRole('img', { name: /^bar 2, cantus F/ }).waitFor()
})

test('a hand goes up on a phone and down again at the lectern', async () => {
  const [, second] = phones
  await second.page.getByRole('button', { name: deskWords.handUp }).click()
  await lectern.button(words.people.lowerSpoken('Zoë Ångström')).click()
  await second.page.getByRole('button', { name: deskWords.handUp }).waitFor()
})

test('ended, the lesson says so on every screen and keeps the board', async () => {
  await lectern.button(words.end).click()
  await lectern.button(words.endGo).click()
  await lectern.sees(words.endedLead)
  for (const phone of phones) await phone.sees(lessonWords.closedBecause['lesson-ended'])
  await wall.getByText(wallWords.ended).waitFor()
})

test('nothing threw, and no policy was crossed, on any screen of the lesson', () => {
  expect(troubles).toEqual([])
})

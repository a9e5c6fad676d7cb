/** Asking why in the middle of a lesson, and a teacher's own rules from a preset to a file and back. */
import { readFile } from 'node:fs/promises'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { ruleSets as words } from '@/components/words/en/rule-sets'
import { rules as bookWords } from '@/components/words/en/rules'
import { ruleSets } from '@/shared/api/rule-sets'
import { ask } from './support/ask'
import { findBarriers, findSideScroll } from './support/check-page'
import { launchChromium } from './support/chromium'
import { deskFace } from './support/desk-face'
import { keepLastPictures } from './support/keep-picture'
import { lecternFace } from './support/lectern-face'
import { openLesson } from './support/prepare-lesson'
import { openSchool, type School } from './support/school'
import { openDevice } from './support/screens'
import { settled } from './support/settled'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(60_000)

let school: School
let browser: Browser
let teacher: BrowserContext
let page: Page

beforeAll(async () => {
  ;[school, browser] = await Promise.all([openSchool(), launchChromium()])
  teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
  page = await teacher.newPage()
}, 120_000)

afterAll(async () => {
  await keepLastPictures(browser, 'rules')
  await browser.close()
  await school.close()
})

const listSets = async () => (await ask(teacher.request, school.origin, ruleSets.list)).ruleSets

it('answers a student who asks why, over the desk, and gives the desk back', async () => {
  const lesson = await openLesson(teacher.request, school.origin, 'Asking why')
  const front = await teacher.newPage()
  const lectern = lecternFace(front)
  await front.goto(`/lessons/${lesson.id}/lectern`)
  await lectern.release(1, 2)
  const student = await openDevice(browser, school.origin, 'phone')
  await signIn(student, school, findPerson(school, 'student'))
  const desk = deskFace(await student.newPage())
  await desk.page.goto(`/lessons/${lesson.id}/desk`)
  await desk.propose(1, 'B, major sixth')
  await desk.page
    .getByRole('link', { name: /^Why\?/ })
    .first()
    .click()
  const dialog = desk.page.getByRole('dialog')
  await dialog.getByRole('heading', { name: bookWords.sources, exact: true }).waitFor()
  await dialog.getByRole('figure').first().waitFor()
  await settled(desk.page)
  expect(await findBarriers(desk.page)).toEqual([])
  expect(await findSideScroll(desk.page)).toBe(0)
  await desk.page.keyboard.press('Escape')
  await dialog.waitFor({ state: 'detached' })
  expect(desk.page.url()).toContain(`/lessons/${lesson.id}/desk`)
  expect(await desk.barInHand()).toBe(1)
  await front.close()
  await desk.page.close()
})

it('opens the rule book to anybody, and finds a rule in it', async () => {
  const visitor = await (await openDevice(browser, school.origin, 'phone')).newPage()
  await visitor.goto('/rules')
  await visitor.getByLabel(bookWords.search).fill('similar motion fifth octave')
  await visitor.getByRole('link', { name: 'No similar motion into a fifth or octave' }).click()
  await visitor.getByRole('figure').nth(1).waitFor()
  await visitor.getByText('Both voices rise into a fifth.').waitFor()
  await visitor.close()
})

it('shows what a change does on an example, and keeps what was made', async () => {
  await page.goto('/rule-sets/new?from=starter')
  const tries = page.getByRole('button', { name: /^See what/ })
  await page.getByLabel('Find a rule').fill('no overlap')
  await tries.first().click()
  const trial = page.getByRole('group', { name: words.tryItSpoken('No overlap') })
  await trial.getByText(words.same).waitFor()
  await page
    .getByRole('radiogroup', { name: 'How “No overlap” counts' })
    .getByRole('radio', { name: 'off' })
    .check()
  await trial.getByText(words.before, { exact: true }).waitFor()
  await trial.getByText(words.isOff).waitFor()
  await page.getByText(words.changes(1)).waitFor()
  await page.getByLabel(words.name).fill('By hand')
  await page.getByRole('button', { name: words.keep, exact: true }).click()
  await page.waitForURL(/\/rule-sets\/(?!new)/)
  const [kept] = await listSets()
  expect(kept).toMatchObject({ name: 'By hand', basedOn: 'starter', isMine: true })
})

it('exports a rule set and takes the file in again', async () => {
  const [kept] = await listSets()
  await page.goto(`/rule-sets/${kept?.id}`)
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: words.export }).click(),
  ])
  expect(download.suggestedFilename()).toBe('by-hand.rules.json')
  const buffer = await readFile(await download.path())
  await page.goto('/rule-sets')
  const take = page.locator('input[type=file]')
  await take.setInputFiles({ name: 'broken.json', mimeType: 'application/json', buffer: Buffer.from('{') })
  await page.getByText(words.importNotJson).waitFor()
  const wrong = Buffer.from(
    JSON.stringify({ version: 1, name: 'Wrong', rules: { 'no-such-rule': { level: 'law' } } }),
  )
  await take.setInputFiles({ name: 'wrong.json', mimeType: 'application/json', buffer: wrong })
  await page.getByText(words.importRefused(['“no-such-rule”'])).waitFor()
  await take.setInputFiles({ name: 'by-hand.rules.json', mimeType: 'application/json', buffer })
  await page.waitForURL(/\/rule-sets\/[\w-]{8,}$/)
  const sets = await listSets()
  expect(sets.map(({ name }) => name)).toEqual(['By hand', 'By hand'])
  await page.goto(`/rule-sets/compare?a=${sets[0]?.id}&b=${sets[1]?.id}`)
  await page.getByText(words.compared.same).waitFor()
  await page.goto(`/rule-sets/compare?a=${sets[0]?.id}&b=starter`)
  await page.getByRole('link', { name: 'No overlap' }).waitFor()
})

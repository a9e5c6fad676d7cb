/** A student's whole way by keyboard alone, and by what a screen reader is told alone. No pointer is used in this file. */
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { desk as deskWords } from '@/components/words/en/desk'
import { join as joinWords } from '@/components/words/en/join'
import { keepLastPictures } from './support/keep-picture'
import { launchChromium } from './support/chromium'
import { eventually } from './support/eventually'
import { lecternFace, type LecternFace } from './support/lectern-face'
import { openLesson } from './support/prepare-lesson'
import { openSchool, type School } from './support/school'
import { openDevice } from './support/screens'
import { settled } from './support/settled'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(60_000)

const MOST_PRESSES = 60

let school: School
let browser: Browser
let teacher: BrowserContext
let lectern: LecternFace
let page: Page
let code = ''

/** What a screen reader says of the element that has the focus. */
const focused = (): Promise<string> =>
  page.evaluate(() => {
    const element = document.activeElement
    const label = element?.id ? document.querySelector(`label[for="${element.id}"]`)?.textContent : null
    return (element?.getAttribute('aria-label') ?? label ?? element?.textContent ?? '').trim()
  })

/** Presses Tab until the focus is on what is named so. */
async function tabTo(name: RegExp): Promise<void> {
  const passed: string[] = []
  for (let presses = 0; presses < MOST_PRESSES; presses += 1) {
    const at = await focused()
    if (name.test(at)) return
    passed.push(at)
    await page.keyboard.press('Tab')
  }
  throw new Error(`The Tab key never came to ${String(name)}. It passed: ${[...new Set(passed)].join(' | ')}`)
}

beforeAll(async () => {
  ;[school, browser] = await Promise.all([openSchool(), launchChromium()])
  teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
  const lesson = await openLesson(teacher.request, school.origin, 'By keyboard')
  code = lesson.code
  const front = await teacher.newPage()
  await front.goto(`/lessons/${lesson.id}/lectern`)
  lectern = lecternFace(front)
  await lectern.release(9, 11)
  page = await (await openDevice(browser, school.origin, 'phone')).newPage()
}, 120_000)

afterAll(async () => {
  await keepLastPictures(browser, 'keyboard')
  await browser?.close()
  await school?.close()
})

test('joins: the code is typed, then a name, each sent with Enter', async () => {
  await page.goto('/join')
  await settled(page)
  await tabTo(new RegExp(`^${joinWords.typeInstead}`))
  await page.keyboard.press('Enter')
  await tabTo(new RegExp(`^${joinWords.typedLabel}`))
  await page.keyboard.type(code.replaceAll('-', ' '))
  await page.keyboard.press('Enter')
  await page.getByRole('textbox', { name: joinWords.nameLabel, exact: true }).waitFor()
  await tabTo(new RegExp(`^${joinWords.nameLabel}`))
  await page.keyboard.type('Bérénice')
  await page.keyboard.press('Enter')
  await page.getByRole('heading', { level: 1, name: deskWords.titleReleased([9, 10, 11]) }).waitFor()
})

test('the ladder is one stop of the Tab key, and says of every rung what it would be', async () => {
  await tabTo(/^bar 9, [A-G]/)
  const rungs = page.getByRole('radio')
  const spoken = await rungs.evaluateAll((all) => all.map((rung) => rung.getAttribute('aria-label') ?? ''))
  expect(spoken.length).toBeGreaterThan(7)
  for (const sentence of spoken) {
    expect(sentence).toMatch(
      /^bar 9, [A-G]( sharp| flat)?, ((minor |major |augmented |diminished )?\w+ (above|below)|unison with) F\b.*[.;]/,
    )
  }
  expect(new Set(spoken).size).toBe(spoken.length)
})

test('letters and arrows move along it, Enter proposes, Space sounds, and the rubric is told', async () => {
  await page.keyboard.press('d')
  await eventually('a rung of D', focused, (name) => name.startsWith('bar 9, D'))
  await page.keyboard.press('ArrowUp')
  await page.keyboard.press('ArrowDown')
  await page.keyboard.press('Enter')
  await page.getByRole('radio', { name: /^bar 9, D\b/, checked: true }).waitFor()
  await page.keyboard.press(' ')
  expect(await focused()).toMatch(/^bar 9, D/)
  await lectern.room(9, 11).getByText('Bérénice').waitFor()
})

test('arrows sideways go from bar to bar, with the focus staying on the ladder', async () => {
  await page.keyboard.press('ArrowRight')
  await page.getByRole('radiogroup', { name: deskWords.ladder.label(10) }).waitFor()
  await eventually('a rung of bar 10', focused, (name) => name.startsWith('bar 10, '))
  await page.keyboard.press('b')
  await page.keyboard.press('Enter')
  await page.getByRole('radio', { name: /^bar 10, B\b/, checked: true }).waitFor()
})

test('Backspace takes the note away again', async () => {
  await page.keyboard.press('Backspace')
  await eventually(
    'no rung chosen',
    () => page.getByRole('radio', { checked: true }).count(),
    (count) => count === 0,
  )
  expect(await focused()).toMatch(/^bar 10, /)
})

test('hears the work, and stops it, from the foot of the page', async () => {
  await tabTo(new RegExp(`^${deskWords.hear}$`))
  await page.keyboard.press('Enter')
  await eventually('the button to stop', focused, (name) => name === deskWords.stop)
  await page.keyboard.press('Enter')
  await eventually('the button to hear', focused, (name) => name === deskWords.hear)
})

test('reads the whole score as text, a sentence a bar', async () => {
  const sentences = await page
    .getByRole('list', { name: deskWords.textTitle })
    .getByRole('listitem')
    .allInnerTexts()
  expect(sentences).toHaveLength(11)
  expect(sentences[8]).toMatch(/^bar 9, D, major sixth above F/i)
  expect(sentences[0]).toMatch(/^bar 1, cantus D, nothing written/i)
})

test('is told of a frozen bar and of the draft that is kept', async () => {
  await lectern.button('Freeze 9–11').focus()
  await lectern.page.keyboard.press('Enter')
  await tabTo(new RegExp(`^${deskWords.pass.previousSpoken(9)}`))
  await page.keyboard.press('Enter')
  await page.getByText(deskWords.closed.draft('D')).waitFor()
})

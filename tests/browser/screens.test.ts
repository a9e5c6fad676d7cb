/** Every screen, looked at with the eyes that may see it: barriers, contrast on both grounds, widths, zoom, sizes of targets. */
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { findBarriers, findSideScroll, findSmallTargets } from './support/check-page'
import { keepLastPictures } from './support/keep-picture'
import { launchChromium } from './support/chromium'
import { deskFace } from './support/desk-face'
import { openLesson } from './support/prepare-lesson'
import { openSchool, type School } from './support/school'
import { listScreens, type Screen } from './support/screen-list'
import { GROUNDS, openDevice } from './support/screens'
import { inked, settled } from './support/settled'
import { findPerson, signIn } from './support/sign-in'

jest.setTimeout(120_000)

const WIDTHS_PX = [320, 390, 768, 1366, 1920, 3840] as const
/** Half of a small laptop: what is left of it at 200 % zoom. */
const ZOOMED = { width: 640, height: 400 } as const
const TARGET_PX = 44

let school: School
let browser: Browser
let screens: readonly Screen[]
const pages = new Map<string, Page>()

/** A page for each pair of eyes, reused from screen to screen. The policy is set aside, or axe-core could not be put in. */
async function pageFor(who: Screen['who']): Promise<Page> {
  const known = pages.get(String(who))
  if (known) return known
  const context = await openDevice(browser, school.origin, 'laptop', { bypassCSP: true, hasTouch: true })
  if (who !== null && who !== 'wall') await signIn(context, school, findPerson(school, who))
  const page = await context.newPage()
  pages.set(String(who), page)
  return page
}

async function look({ who, path }: Screen, width = 1366, height = 768): Promise<Page> {
  const page = await pageFor(who)
  await page.setViewportSize({ width, height })
  // A wall link is spent once used; its machine then finds the wall at the lesson's own address.
  const isSpent = who === 'wall' && page.url().includes('/lessons/')
  await page.goto(isSpent ? page.url() : path)
  if (who === 'wall') await page.waitForURL(/\/lessons\/.+\/wall/)
  await settled(page)
  return page
}

beforeAll(async () => {
  ;[school, browser] = await Promise.all([openSchool(), launchChromium()])
  const teacher: BrowserContext = (await pageFor('teacher')).context()
  const lesson = await openLesson(teacher.request, school.origin, 'A second voice over the cantus in D')
  screens = await listScreens(teacher, school.origin, lesson.id)
  // A lesson with something in it: bars released, and a student's breach.
  const lectern = await pageFor('teacher')
  await lectern.goto(`/lessons/${lesson.id}/lectern`)
  await settled(lectern)
  await lectern.getByRole('option', { name: /^bar 9\b/ }).click()
  await lectern.getByRole('option', { name: /^bar 11\b/ }).click({ modifiers: ['Shift'] })
  await lectern.getByRole('button', { name: 'Release 9–11' }).click()
  const student = await pageFor('student')
  await student.goto(`/lessons/${lesson.id}/desk`)
  const desk = deskFace(student)
  await desk.propose(9, 'C, fifth above F')
  await desk.propose(10, 'B, fifth above E')
  await desk.kept()
}, 180_000)

afterAll(async () => {
  await keepLastPictures(browser, 'screens')
  await browser?.close()
  await school?.close()
})

const everyScreen = async <Value>(check: (screen: Screen) => Promise<readonly Value[]>): Promise<Value[]> => {
  const found: Value[] = []
  for (const screen of screens) found.push(...(await check(screen)))
  return found
}

test('no screen has a barrier that axe-core finds, on either ground', async () => {
  const barriers = await everyScreen(async (screen) => {
    const page = await look(screen)
    const found: string[] = []
    for (const ground of GROUNDS) {
      await page.emulateMedia({ colorScheme: ground })
      await inked(page)
      found.push(...(await findBarriers(page)).map((barrier) => `${screen.name}, ${ground}: ${barrier}`))
    }
    return found
  })
  expect(barriers).toEqual([])
})

test('on a phone, no screen has a barrier that axe-core finds, and every control is large enough for a finger', async () => {
  const found = await everyScreen(async (screen) => {
    const page = await look(screen, 390, 844)
    const small = await findSmallTargets(page, TARGET_PX)
    return [...(await findBarriers(page)), ...small].map((trouble) => `${screen.name}: ${trouble}`)
  })
  expect(found).toEqual([])
})

test('from 320 to 3840 pixels, and at 200 % zoom, no screen scrolls sideways', async () => {
  const wide = await everyScreen(async (screen) => {
    const page = await look(screen)
    const found: string[] = []
    for (const { width, height } of [...WIDTHS_PX.map((width) => ({ width, height: 800 })), ZOOMED]) {
      await page.setViewportSize({ width, height })
      // The layout follows the window in the frames after it changed.
      await page.evaluate(
        () => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(() => done(null)))),
      )
      const overPx = await findSideScroll(page)
      if (overPx > 0) found.push(`${screen.name} at ${width}: ${overPx} px over`)
    }
    return found
  })
  expect(wide).toEqual([])
})

test('every screen names itself in the title, has one main part and one first heading', async () => {
  const titles = await everyScreen(async (screen) => {
    const page = await look(screen)
    const [title, mains, heads] = await Promise.all([
      page.title(),
      page.getByRole('main').count(),
      page.getByRole('heading', { level: 1 }).count(),
    ])
    expect({ name: screen.name, mains, heads }).toEqual({ name: screen.name, mains: 1, heads: 1 })
    return [title]
  })
  for (const title of titles) expect(title).toMatch(/Bicinium/)
})

test('with reduced motion nothing is in motion', async () => {
  const moving = await everyScreen(async (screen) => {
    const page = await pageFor(screen.who)
    await page.emulateMedia({ reducedMotion: 'reduce' })
    await look(screen)
    const running = await page.evaluate(
      () => document.getAnimations().filter(({ playState }) => playState === 'running').length,
    )
    return running > 0 ? [`${screen.name}: ${running} animations`] : []
  })
  expect(moving).toEqual([])
})

test('everything a keyboard reaches shows where it is', async () => {
  const unseen = await everyScreen(async (screen) => {
    const page = await look(screen)
    await page.evaluate(() => (document.activeElement as HTMLElement | null)?.blur())
    const found: string[] = []
    for (let presses = 0; presses < 12; presses += 1) {
      await page.keyboard.press('Tab')
      const trouble = await page.evaluate(() => {
        const element = document.activeElement
        if (!(element instanceof HTMLElement) || element === document.body) return null
        const own = getComputedStyle(element)
        const shown = [element, element.parentElement].some((each) => {
          const style = each && getComputedStyle(each)
          return style && style.outlineStyle !== 'none' && parseFloat(style.outlineWidth) >= 1
        })
        const isFramed = own.boxShadow !== 'none' || /INPUT|TEXTAREA|SELECT/.test(element.tagName)
        return shown || isFramed
          ? null
          : (element.getAttribute('aria-label') ?? element.textContent ?? element.tagName)
      })
      if (trouble) found.push(`${screen.name}: ${trouble.trim().slice(0, 60)}`)
    }
    return found
  })
  expect(unseen).toEqual([])
})

/**
 * Takes pictures of every screen, in three sizes and on both grounds, from a school in the middle of a lesson, into
 * `tests/artefacts/tour/`. For looking at the product, and for the README: `npx tsx tests/browser/tour.ts [screen …]`
 */
import { mkdir } from 'node:fs/promises'
import path from 'node:path'
import type { BrowserContext, Page } from 'playwright-core'
import { withTestCluster } from '@/tests/support/with-test-cluster'
import { launchChromium } from './support/chromium'
import { deskFace } from './support/desk-face'
import { fillRoom } from './support/fill-room'
import { lecternFace } from './support/lectern-face'
import { openLesson } from './support/prepare-lesson'
import { openSchool } from './support/school'
import { listScreens, type Screen } from './support/screen-list'
import { GROUNDS, openDevice, SIZES, type Size } from './support/screens'
import { settled } from './support/settled'
import { findPerson, signIn } from './support/sign-in'

const FOLDER = 'tests/artefacts/tour'
const only = process.argv.slice(2)

async function takeTour(): Promise<void> {
  await mkdir(FOLDER, { recursive: true })
  const [school, browser] = await Promise.all([openSchool(), launchChromium()])
  const contexts = new Map<string, BrowserContext>()
  const contextOf = async (who: Screen['who']): Promise<BrowserContext> => {
    const known = contexts.get(String(who))
    if (known) return known
    const context = await openDevice(browser, school.origin, 'laptop')
    if (who !== null && who !== 'wall') await signIn(context, school, findPerson(school, who))
    contexts.set(String(who), context)
    return context
  }
  try {
    const teacher = await contextOf('teacher')
    const lesson = await openLesson(teacher.request, school.origin, 'A second voice over the cantus in D')
    const lectern = lecternFace(await teacher.newPage())
    await lectern.page.goto(`/lessons/${lesson.id}/lectern`)
    await lectern.release(9, 11)
    await fillRoom(browser, school, lesson.code)
    await lectern.select(2, 3)
    await lectern.button('Set aside').click()
    const student = deskFace(await (await contextOf('student')).newPage())
    await student.page.goto(`/lessons/${lesson.id}/desk`)
    await student.propose(9, 'C, fifth')
    await student.propose(10, 'B, fifth')
    await student.kept()
    await student.page.close()

    let wallAddress: string | null = null
    for (const screen of await listScreens(teacher, school.origin, lesson.id)) {
      if (only.length > 0 && !only.includes(screen.name)) continue
      for (const ground of GROUNDS) {
        for (const size of Object.keys(SIZES) as Size[]) {
          const page = await (await contextOf(screen.who)).newPage()
          await page.emulateMedia({ colorScheme: ground, reducedMotion: 'reduce' })
          await page.setViewportSize(SIZES[size])
          await page.goto(screen.who === 'wall' ? (wallAddress ?? screen.path) : screen.path)
          if (screen.who === 'wall') {
            await page.waitForURL(/\/lessons\/.+\/wall/)
            wallAddress = page.url()
          }
          await takePicture(page, `${screen.name}-${size}-${ground}`)
          await page.close()
        }
      }
    }
  } finally {
    await browser.close()
    await school.close()
  }
}

async function takePicture(page: Page, name: string): Promise<void> {
  await settled(page)
  await page.screenshot({ path: path.join(FOLDER, `${name}.png`) })
  console.log(name)
}

withTestCluster(takeTour).catch((error) => {
  console.error(error)
  process.exitCode = 1
})

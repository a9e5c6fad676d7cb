/** The client's lines: a middling phone on a school's network, the peer a bare export of the same framework. */
import type { Browser } from 'playwright-core'
import { lessons } from '@/shared/api/lessons'
import { launchChromium } from '@/tests/browser/support/chromium'
import { ask } from '@/tests/browser/support/ask'
import { deskFace } from '@/tests/browser/support/desk-face'
import { lecternFace, type LecternFace } from '@/tests/browser/support/lectern-face'
import { openLesson } from '@/tests/browser/support/prepare-lesson'
import { openSchool, type School } from '@/tests/browser/support/school'
import { openDevice } from '@/tests/browser/support/screens'
import { settled } from '@/tests/browser/support/settled'
import { findPerson, signIn } from '@/tests/browser/support/sign-in'
import { withTestCluster } from '@/tests/support/with-test-cluster'
import { openGuestSheet, type GuestSheet } from './client/guest-sheet'
import { measureTap } from './client/measure-tap'
import { readShift, slowDown, takeLongestFrame, watchShifts } from './client/watch-page'
import type { BenchGroup, BenchRow } from './row'
import { exportBareApp } from './support/bare-export'
import { loadCold, PHONE } from './support/cold-load'
import { serveFolder } from './support/serve-folder'

type Tell = (progress: string) => void
type Room = Readonly<{
  school: School
  browser: Browser
  lectern: LecternFace
  lessonId: string
  code: string
}>

const LOADS = 5
const TAPS = 40
const PROPOSALS = 500
const BURSTS = 20
const BURST = 10
const KILOBYTE = 1024

async function openRoom(school: School, browser: Browser): Promise<Room> {
  const teacher = await openDevice(browser, school.origin, 'laptop')
  await signIn(teacher, school, findPerson(school, 'teacher'))
  const { id, code } = await openLesson(teacher.request, school.origin, 'A measured lesson')
  const page = await teacher.newPage()
  await watchShifts(page)
  await page.goto(`/lessons/${id}/lectern`)
  const lectern = lecternFace(page)
  await lectern.release(9, 11)
  return { school, browser, lectern, lessonId: id, code }
}

/** C1 and C2, ours and the peer's in turns, so that both meet the same machine. */
async function measureLoads(
  { school, browser, lessonId, code }: Room,
  tell: Tell,
): Promise<readonly BenchRow[]> {
  tell('exporting the bare app')
  const bare = await exportBareApp(process.cwd())
  const served = await serveFolder(bare.folder)
  const guest = await openDevice(browser, school.origin, 'phone')
  await ask(guest.request, school.origin, lessons.join, { body: { code, name: 'A cold phone' } })
  const storageState = await guest.storageState()
  try {
    const desk = `${school.origin}/lessons/${lessonId}/desk`
    const loadDesk = (isPhone: boolean) =>
      loadCold(browser, desk, (page) => deskFace(page).ladder.waitFor(), { isPhone, storageState })
    const loadBare = (isPhone: boolean) =>
      loadCold(browser, served.origin, (page) => page.getByText('Bare').waitFor(), { isPhone })
    tell('C1, C2: cold loads')
    const weights = { desk: await loadDesk(false), bare: await loadBare(false) }
    const deskMs: number[] = []
    const bareMs: number[] = []
    for (let load = 0; load < LOADS; load += 1) {
      deskMs.push((await loadDesk(true)).elapsedMs)
      bareMs.push((await loadBare(true)).elapsedMs)
    }
    const kilobytes = (load: { bytes: number }) => [load.bytes / KILOBYTE]
    return [
      { line: 'C1', work: 'bytes to a usable desk, cold, as served', samples: kilobytes(weights.desk), unit: 'KB', goal: '' },
      { line: 'C1', work: 'bytes of the bare export, served alike', samples: kilobytes(weights.bare), unit: 'KB', goal: '' },
      { line: 'C1', work: 'desk to bare export', samples: [weights.desk.bytes / weights.bare.bytes], unit: '×', goal: 'at most 1.35 ×' },
      { line: 'C2', work: 'time to a usable desk, cold, slow phone', samples: deskMs, unit: 'ms', goal: '' },
      { line: 'C2', work: 'time to the bare export’s first screen', samples: bareMs, unit: 'ms', goal: '' },
      { line: 'C2', work: 'desk to bare export, run by run', samples: deskMs.map((ms, run) => ms / (bareMs[run] as number)), unit: '×', goal: 'at most 1.5 ×' },
    ] // prettier-ignore
  } finally {
    await guest.close()
    await served.close()
    await bare.remove()
  }
}

/** C3, and the desk's part of C5. */
async function measureDesk({ school, browser, code }: Room, tell: Tell): Promise<readonly BenchRow[]> {
  tell('C3: taps on the ladder')
  const context = await openDevice(browser, school.origin, 'phone')
  const { lessonId } = await ask(context.request, school.origin, lessons.join, {
    body: { code, name: 'A tapping phone' },
  })
  const page = await context.newPage()
  await watchShifts(page)
  await page.goto(`/lessons/${lessonId}/desk`)
  const desk = deskFace(page)
  await desk.hold(9)
  await slowDown(page, PHONE.slowdown)
  const rungs = ['A, major third', 'C, fifth', 'D, major sixth', 'E, major seventh'] as const
  const samples: number[] = []
  for (let tap = 0; tap < TAPS; tap += 1) {
    const rung = rungs[tap % rungs.length] as string
    samples.push(await measureTap(page, `bar 9, ${rung}`, `bar 9, cantus F, ${rung.charAt(0)} proposed`))
  }
  await desk.propose(10, 'B, fifth')
  await desk.propose(11, 'A, fifth')
  await desk.kept()
  const shift = await readShift(page)
  await context.close()
  return [
    { line: 'C3', work: 'tap on the ladder to lozenge and findings painted, slow phone', samples, unit: 'ms', goal: 'p95 under 50 ms' },
    { line: 'C5', work: 'layout shift, desk: come in, write three bars, breaches told', samples: [shift], unit: '', goal: 'at most 0.02' },
  ] // prettier-ignore
}

/** C4, and the parts of wall and lectern in C5. */
async function measureWall(room: Room, tell: Tell): Promise<readonly BenchRow[]> {
  const { school, browser, lessonId, code, lectern } = room
  const projector = await openDevice(browser, school.origin, 'projector')
  const teacher = lectern.page.context().request
  const link = await ask(teacher, school.origin, lessons.createWallLink, { params: { lessonId } })
  const wall = await projector.newPage()
  await watchShifts(wall)
  await wall.goto(link.url)
  await settled(wall)
  tell(`C4: ${PROPOSALS} proposals come in`)
  const pitches = ['A4', 'B4', 'C5', 'D5', 'E5', 'F5', 'G4', 'G5'] as const
  const sheets: GuestSheet[] = []
  const perPhone = 3
  for (let phone = 0; phone < Math.ceil(PROPOSALS / perPhone); phone += 1) {
    const sheet = await openGuestSheet(school.origin, code, `Guest ${phone + 1}`)
    sheets.push(sheet)
    for (const [place, bar] of [9, 10, 11].entries()) {
      sheet.propose(bar, pitches[(phone * (place + 1)) % pitches.length] as string)
    }
  }
  await wall.getByText(new RegExp(`^${sheets.length}\\s`)).waitFor({ timeout: 60_000 })
  await slowDown(wall, PHONE.slowdown)
  await takeLongestFrame(wall)
  const frames: number[] = []
  for (let burst = 0; burst < BURSTS; burst += 1) {
    tell(`C4: burst ${burst + 1} of ${BURSTS}`)
    await takeLongestFrame(wall)
    for (let each = 0; each < BURST; each += 1) {
      const sheet = sheets[(burst * BURST + each) % sheets.length] as GuestSheet
      sheet.propose(9, pitches[(burst + each + 1) % pitches.length] as string)
    }
    // Long enough for the burst to come, be read, judged and drawn; what is measured is the worst frame of it.
    await new Promise((resolve) => setTimeout(resolve, 600))
    frames.push(await takeLongestFrame(wall))
  }
  for (const sheet of sheets) sheet.close()
  const shifts = { wall: await readShift(wall), lectern: await readShift(lectern.page) }
  await projector.close()
  return [
    { line: 'C4', work: `longest frame of a wall with ${PROPOSALS} proposals, ten arriving at once, slowed 4 ×`, samples: frames, unit: 'ms', goal: 'no frame over 50 ms' },
    { line: 'C5', work: `layout shift, wall: ${PROPOSALS} proposals come in`, samples: [shifts.wall], unit: '', goal: 'at most 0.02' },
    { line: 'C5', work: `layout shift, lectern: the same`, samples: [shifts.lectern], unit: '', goal: 'at most 0.02' },
  ] // prettier-ignore
}

export const runBench: BenchGroup = (tell) =>
  withTestCluster(async () => {
    const [school, browser] = await Promise.all([openSchool(), launchChromium()])
    try {
      const room = await openRoom(school, browser)
      return [
        ...(await measureLoads(room, tell)),
        ...(await measureDesk(room, tell)),
        ...(await measureWall(room, tell)),
      ]
    } finally {
      await browser.close()
      await school.close()
    }
  })

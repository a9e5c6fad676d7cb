import type { Browser } from 'playwright-core'
import { lessons } from '@/shared/api/lessons'
import { ask } from './ask'
import { deskFace } from './desk-face'
import type { School } from './school'
import { openDevice } from './screens'

/** What an invented class offers for bars 9 to 11 over Fux's dorian cantus: agreement, a breach, a remark, a beginning. */
const OFFERS: readonly (readonly [name: string, notes: readonly (readonly [bar: number, spoken: string])[]])[] = [
  ['Mirela', [[9, 'D, major sixth'], [10, 'B, fifth'], [11, 'D, octave']]],
  ['Tomasz', [[9, 'D, major sixth'], [10, 'B, fifth'], [11, 'D, octave']]],
  ['Annika', [[9, 'A, major third'], [10, 'C, minor sixth'], [11, 'D, octave']]],
  ['Ifeoma', [[9, 'C, fifth'], [10, 'B, fifth'], [11, 'A, fifth']]],
  ['Léon', [[9, 'C, fifth'], [10, 'B, fifth'], [11, 'A, fifth']]],
  ['Jun', [[9, 'D, major sixth'], [10, 'G, minor third']]],
] // prettier-ignore

/** Lets a small class of guests come in and offer its gestures, each from a phone of its own, which then goes. */
export async function fillRoom(browser: Browser, school: School, code: string): Promise<void> {
  for (const [name, notes] of OFFERS) {
    const context = await openDevice(browser, school.origin, 'phone')
    const { lessonId } = await ask(context.request, school.origin, lessons.join, { body: { code, name } })
    const page = await context.newPage()
    await page.goto(`/lessons/${lessonId}/desk`)
    const desk = deskFace(page)
    for (const [bar, spoken] of notes) await desk.propose(bar, spoken)
    await desk.kept()
    await context.close()
  }
}

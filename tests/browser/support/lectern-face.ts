import type { Locator, Page } from 'playwright-core'
import { lectern as words } from '@/components/words/en/lectern'
import { lesson } from '@/components/words/en/lesson'

/** The teacher's lectern, found as a person finds it: by roles and names. */
export function lecternFace(page: Page) {
  const score = page.getByRole('listbox', { name: words.scoreLabel })
  const bar = (number: number): Locator =>
    score.getByRole('option', { name: new RegExp(`^bar ${number}\\b`) })
  const button = (name: string): Locator => page.getByRole('button', { name, exact: true })

  return {
    page,
    bar,
    button,
    /** Selects a span of bars with the pointer. */
    async select(from: number, to = from): Promise<void> {
      await bar(from).click()
      if (to !== from) await bar(to).click({ modifiers: ['Shift'] })
      await score
        .getByRole('option', { selected: true })
        .nth(to - from)
        .waitFor()
      const last = score.getByRole('option', { name: new RegExp(`^bar ${to}\\b`), selected: true })
      await last.waitFor()
    },
    async release(from: number, to = from): Promise<void> {
      await this.select(from, to)
      await button(words.release(lesson.barsShort(spanOf(from, to)))).click()
      await button(words.freeze(lesson.barsShort(spanOf(from, to)))).waitFor()
    },
    /** The list of the room's proposals for a span. */
    room: (from: number, to: number): Locator =>
      page.getByRole('region', { name: words.room.title(spanOf(from, to)) }),
    sees: (text: string | RegExp) => page.getByText(text).first().waitFor(),
  }
}
export type LecternFace = ReturnType<typeof lecternFace>

const spanOf = (from: number, to: number): readonly number[] =>
  Array.from({ length: to - from + 1 }, (_, index) => from + index)

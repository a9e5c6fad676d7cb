import type { Locator, Page } from 'playwright-core'
import { desk as words } from '@/components/words/en/desk'

/** A student's desk, found as a person finds it: by roles and names. */
export function deskFace(page: Page) {
  const ladder = page.getByRole('radiogroup', { name: /^Pitches for bar \d+/ })

  /** The bar that the ladder is for. */
  const barInHand = async (): Promise<number> => {
    const label = (await ladder.getAttribute('aria-label')) ?? ''
    return Number(/bar (\d+)/.exec(label)?.[1])
  }

  return {
    page,
    ladder,
    barInHand,
    /** A rung by the start of what is said of it: `bar 9, D, major sixth above F`. */
    rung: (spoken: string): Locator => page.getByRole('radio', { name: new RegExp(`^${spoken}\\b`) }),
    /** Takes a bar in hand by the buttons at the foot. */
    async hold(bar: number): Promise<void> {
      for (let at = await barInHand(); at !== bar; at = at < bar ? at + 1 : at - 1) {
        const name = at < bar ? words.pass.nextSpoken(at + 1) : words.pass.previousSpoken(at - 1)
        await page.getByRole('button', { name, exact: true }).click()
        await page.getByRole('radiogroup', { name: words.ladder.label(at < bar ? at + 1 : at - 1) }).waitFor()
      }
    },
    /** Proposes a pitch in a bar, and waits until the rung shows it. */
    async propose(bar: number, pitch: string): Promise<void> {
      await this.hold(bar)
      const rung = this.rung(`bar ${bar}, ${pitch}`)
      await rung.click()
      await page.getByRole('radio', { name: new RegExp(`^bar ${bar}, ${pitch}\\b`), checked: true }).waitFor()
    },
    /** Waits until everything that was written is in the server's journal. */
    kept: () => page.getByRole('status', { name: words.keptSpoken.kept }).waitFor(),
    heading: (text: string) => page.getByRole('heading', { level: 1, name: text, exact: true }).waitFor(),
    sees: (text: string | RegExp) => page.getByText(text).first().waitFor(),
  }
}
export type DeskFace = ReturnType<typeof deskFace>

import type { Page } from 'playwright-core'

/** Waits until what is drawn has followed the page to its other ground: words are inked by the app, the ground by a style sheet. */
export const inked = async (page: Page): Promise<void> => {
  await page.waitForFunction(() => {
    const heading = document.querySelector('h1, [role="heading"]')
    return (
      heading === null || getComputedStyle(heading).color === getComputedStyle(document.documentElement).color
    )
  })
}

/** Waits until a screen stands: its heading is there, nothing is loading, fonts are in. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole('heading').first().waitFor()
  await page.waitForFunction(() => document.querySelector('[aria-busy="true"]') === null)
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
}

import type { Page } from 'playwright-core'

/** Waits until a screen stands: its heading is there, nothing is loading, fonts are in. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole('heading').first().waitFor()
  await page.waitForFunction(() => document.querySelector('[aria-busy="true"]') === null)
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
}

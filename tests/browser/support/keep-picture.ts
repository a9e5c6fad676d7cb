import { mkdir } from 'node:fs/promises'
import path from 'node:path'
import type { Browser, Page } from 'playwright-core'

const FOLDER = 'tests/artefacts/browser'

/** Keeps a screenshot among the test's artefacts, for whoever looks at the product; nothing is compared with it. */
export async function keepPicture(page: Page, name: string): Promise<void> {
  await mkdir(FOLDER, { recursive: true })
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
  await page.screenshot({ path: path.join(FOLDER, `${name}.png`) })
}

/** Keeps how every open page looked at the end, which tells of a failed test what its message cannot. */
export async function keepLastPictures(browser: Browser | undefined, name: string): Promise<void> {
  const pages = browser?.contexts().flatMap((context) => context.pages()) ?? []
  await mkdir(FOLDER, { recursive: true })
  for (const [index, page] of pages.entries()) {
    await page
      .screenshot({ path: path.join(FOLDER, `${name}-last-${index}.png`), timeout: 5000 })
      .catch(() => undefined)
  }
}

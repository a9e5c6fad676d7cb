import { mkdir } from 'node:fs/promises'
import path from 'node:path'
import type { Page } from 'playwright-core'

const FOLDER = 'tests/artefacts/browser'

/** Keeps a screenshot among the test's artefacts, for whoever looks at the product; nothing is compared with it. */
export async function keepPicture(page: Page, name: string): Promise<void> {
  await mkdir(FOLDER, { recursive: true })
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
  await page.screenshot({ path: path.join(FOLDER, `${name}.png`) })
}

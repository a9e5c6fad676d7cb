import { existsSync } from 'node:fs'
import { chromium, type Browser } from 'playwright-core'

const USUAL_PLACES = [
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome',
  '/usr/bin/google-chrome-stable',
  '/opt/google/chrome/chrome',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
]

/** Where Chromium is: named by the environment variable `CHROMIUM`, or in one of the usual places. */
export function findChromium(): string {
  const named = process.env.CHROMIUM
  const found = named ? [named].find(existsSync) : USUAL_PLACES.find(existsSync)
  if (!found) {
    throw new Error(
      named
        ? `There is no Chromium at ${named}, where the environment variable CHROMIUM points.`
        : 'The browser tests need Chromium: `apt-get install chromium`, or set CHROMIUM to its path.',
    )
  }
  return found
}

/** A browser without a window. Its audio goes nowhere, on a clock that moves as a real device's does. */
export const launchChromium = (more: readonly string[] = []): Promise<Browser> =>
  chromium.launch({
    executablePath: findChromium(),
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-background-networking',
      '--disable-component-update',
      '--no-first-run',
      ...more,
    ],
  })

import type { Browser, BrowserContext, BrowserContextOptions } from 'playwright-core'

/** The three sizes that every screen is looked at in. */
export const SIZES = {
  phone: { width: 390, height: 844 },
  laptop: { width: 1366, height: 768 },
  projector: { width: 1920, height: 1080 },
} as const
export type Size = keyof typeof SIZES

/** Longer than any screen takes on a busy machine, shorter than anybody waits for a failing test. */
const PATIENCE_MS = 12_000

export const GROUNDS = ['light', 'dark'] as const
export type ScreenGround = (typeof GROUNDS)[number]

/** A device of its own: cookies, storage and network apart from the others'. Motion is reduced, so that nothing moves under a test. */
export async function openDevice(
  browser: Browser,
  origin: string,
  size: Size,
  more: BrowserContextOptions = {},
): Promise<BrowserContext> {
  const context = await browser.newContext({
    baseURL: origin,
    viewport: SIZES[size],
    hasTouch: size === 'phone',
    isMobile: size === 'phone',
    deviceScaleFactor: 1,
    colorScheme: 'light',
    reducedMotion: 'reduce',
    locale: 'en-GB',
    timezoneId: 'Europe/Berlin',
    ...more,
  })
  context.setDefaultTimeout(PATIENCE_MS)
  // The runner of our programs names inner functions by a helper of its own, which a page does not have.
  await context.addInitScript('globalThis.__name ??= (it) => it')
  return context
}

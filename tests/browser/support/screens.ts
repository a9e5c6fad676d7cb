import type { Browser, BrowserContext, BrowserContextOptions } from 'playwright-core'

/** The three sizes that every screen is looked at in. */
export const SIZES = {
  phone: { width: 390, height: 844 },
  laptop: { width: 1366, height: 768 },
  projector: { width: 1920, height: 1080 },
} as const
export type Size = keyof typeof SIZES

export const GROUNDS = ['light', 'dark'] as const
export type ScreenGround = (typeof GROUNDS)[number]

/** A device of its own: cookies, storage and network apart from the others'. Motion is reduced, so that nothing moves under a test. */
export function openDevice(
  browser: Browser,
  origin: string,
  size: Size,
  more: BrowserContextOptions = {},
): Promise<BrowserContext> {
  return browser.newContext({
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
}

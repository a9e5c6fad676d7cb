import type { Page } from 'playwright-core'

declare global {
  interface Window {
    benchShifts: { value: number; atMs: number }[]
    benchLongestFrameMs: number
  }
}

/** Records every layout shift of a page from its beginning that no touch or key excuses. */
export const watchShifts = (page: Page): Promise<unknown> =>
  page.addInitScript(() => {
    window.benchShifts = []
    new PerformanceObserver((list) => {
      for (const entry of list.getEntries()) {
        const { value, hadRecentInput } = entry as PerformanceEntry & {
          value: number
          hadRecentInput: boolean
        }
        if (!hadRecentInput) window.benchShifts.push({ value, atMs: entry.startTime })
      }
    }).observe({ type: 'layout-shift', buffered: true })
  })

/**
 * Cumulative layout shift as web vitals define it: the largest burst, whose shifts follow each other within a second and
 * which lasts five at most.
 */
export async function readShift(page: Page): Promise<number> {
  const shifts = await page.evaluate(() => window.benchShifts)
  let [largest, sum, firstMs, lastMs] = [0, 0, 0, 0]
  for (const { value, atMs } of shifts) {
    const isNew = sum === 0 || atMs - lastMs > 1000 || atMs - firstMs > 5000
    if (isNew) [sum, firstMs] = [0, atMs]
    sum += value
    lastMs = atMs
    largest = Math.max(largest, sum)
  }
  return largest
}

/** Starts to note the longest frame; the same call again gives what it was since, in milliseconds. */
export const takeLongestFrame = (page: Page): Promise<number> =>
  page.evaluate(() => {
    const isRunning = window.benchLongestFrameMs !== undefined
    const longest = window.benchLongestFrameMs ?? 0
    window.benchLongestFrameMs = 0
    if (!isRunning) {
      let before = performance.now()
      const frame = (): void => {
        const now = performance.now()
        window.benchLongestFrameMs = Math.max(window.benchLongestFrameMs, now - before)
        before = now
        requestAnimationFrame(frame)
      }
      requestAnimationFrame(frame)
    }
    return longest
  })

/** Slows a page's processor, as a middling phone is slower than the machine that measures. */
export async function slowDown(page: Page, rate: number): Promise<void> {
  const session = await page.context().newCDPSession(page)
  await session.send('Emulation.setCPUThrottlingRate', { rate })
}

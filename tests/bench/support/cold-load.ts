import type { Browser, BrowserContextOptions, Page } from 'playwright-core'

/** A middling phone on a school's network. */
export const PHONE = {
  slowdown: 4,
  latencyMs: 150,
  bitsASecond: 1_600_000,
  viewport: { width: 390, height: 844 },
} as const

export type ColdLoad = Readonly<{
  /** Everything that came over the network until the page was usable, headers and fonts too, as compressed. */
  bytes: number
  /** From asking for the address to `isUsable`. */
  elapsedMs: number
}>

/**
 * Opens an address in a browser context that has nothing cached, and waits for it to be usable. With `isPhone` the
 * processor is slowed and the network narrowed.
 */
export async function loadCold(
  browser: Browser,
  address: string,
  isUsable: (page: Page) => Promise<unknown>,
  { isPhone, storageState }: Pick<BrowserContextOptions, 'storageState'> & { isPhone: boolean },
): Promise<ColdLoad> {
  const context = await browser.newContext({ viewport: PHONE.viewport, storageState })
  try {
    const page = await context.newPage()
    const session = await context.newCDPSession(page)
    await session.send('Network.enable')
    let bytes = 0
    session.on('Network.loadingFinished', ({ encodedDataLength }) => (bytes += encodedDataLength))
    session.on('Network.webSocketFrameReceived', ({ response }) => {
      // Binary frames are told in base64, four characters for three bytes.
      const { opcode, payloadData } = response
      bytes += opcode === 1 ? payloadData.length : Math.ceil((payloadData.length * 3) / 4)
    })
    if (isPhone) {
      const bytesASecond = PHONE.bitsASecond / 8
      await session.send('Emulation.setCPUThrottlingRate', { rate: PHONE.slowdown })
      await session.send('Network.emulateNetworkConditions', {
        offline: false,
        latency: PHONE.latencyMs,
        downloadThroughput: bytesASecond,
        uploadThroughput: bytesASecond,
      })
    }
    const startedMs = performance.now()
    await page.goto(address, { waitUntil: 'commit' })
    await isUsable(page)
    const elapsedMs = performance.now() - startedMs
    // What was still on its way when the page became usable counts for the weight, not for the time.
    await page.evaluate(() => document.fonts.ready.then(() => undefined))
    await page.waitForLoadState('load')
    return { bytes, elapsedMs }
  } finally {
    await context.close()
  }
}

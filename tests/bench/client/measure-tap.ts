import type { Page } from 'playwright-core'

/**
 * Taps the rung whose name starts with `spoken`, and gives the milliseconds from the tap to the frame in which rung,
 * lozenge and findings are painted.
 */
export async function measureTap(page: Page, spoken: string, proposed: string): Promise<number> {
  const rung = page.getByRole('radio', { name: new RegExp(`^${spoken}\\b`) })
  const painted = page.evaluate(
    ([start, score]) =>
      new Promise<number>((resolve, reject) => {
        setTimeout(() => reject(new Error('The tap was never painted.')), 10_000)
        document.addEventListener(
          'click',
          (event) => {
            const look = (): void => {
              const isOn = [
                ...Array.from(document.querySelectorAll('[role="radio"][aria-checked="true"]')),
              ].some((each) => each.getAttribute('aria-label')?.startsWith(start as string))
              // The bar of the score is named in the same drawing as its lozenge.
              const isDrawn = document.querySelector(`[aria-label*="${score}"]`) !== null
              if (!isOn || !isDrawn) return void requestAnimationFrame(look)
              // A task that is posted in a frame runs when that frame has been handed to the screen.
              const { port1, port2 } = new MessageChannel()
              port1.onmessage = () => resolve(performance.now() - event.timeStamp)
              requestAnimationFrame(() => port2.postMessage(null))
            }
            requestAnimationFrame(look)
          },
          { capture: true, once: true },
        )
      }),
    [spoken, proposed],
  )
  await rung.click()
  return painted
}

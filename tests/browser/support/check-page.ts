import { readFileSync } from 'node:fs'
import type { Page } from 'playwright-core'

const AXE = readFileSync(require.resolve('axe-core/axe.min.js'), 'utf8')

/** WCAG 2.2 A and AA, and the practices that axe-core holds every page to. */
const TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']

type AxeResult = Readonly<{
  violations: readonly Readonly<{
    id: string
    help: string
    nodes: readonly Readonly<{ target: readonly unknown[]; failureSummary?: string }>[]
  }>[]
}>

/** What axe-core finds wrong with the page as it stands, a line a finding; empty when it is clean. */
export async function findBarriers(page: Page): Promise<readonly string[]> {
  await page.evaluate(AXE)
  const result = (await page.evaluate(
    (tags) =>
      (window as unknown as { axe: { run: (node: Document, options: object) => unknown } }).axe.run(
        document,
        {
          runOnly: tags,
          resultTypes: ['violations'],
        },
      ),
    TAGS,
  )) as AxeResult
  return result.violations.flatMap(({ id, help, nodes }) =>
    nodes.map(({ target, failureSummary }) => {
      const why = failureSummary?.split('\n').slice(1).join(' ').trim() ?? ''
      return `${id}: ${help} — ${target.join(' ')} — ${why}`
    }),
  )
}

/** How many pixels the page is wider than its window: above 0 it scrolls sideways. */
export const findSideScroll = (page: Page): Promise<number> =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)

/** Controls that a finger would miss: smaller than `minPx` either way, and not a link within a sentence. */
export const findSmallTargets = (page: Page, minPx: number): Promise<readonly string[]> =>
  page.evaluate((min) => {
    const controls = Array.from(
      document.querySelectorAll<HTMLElement>(
        'button, [role="button"], [role="radio"], [role="checkbox"], [role="switch"], [role="tab"], input:not([type="hidden"]), select, textarea',
      ),
    )
    return controls.flatMap((control) => {
      const label =
        control.closest('label') ?? (control.id ? document.querySelector(`label[for="${control.id}"]`) : null)
      const boxes = [control, label].flatMap((element) => (element ? [element.getBoundingClientRect()] : []))
      const isShown = control.checkVisibility?.() ?? true
      const isLarge = boxes.some(({ width, height }) => width >= min - 0.5 && height >= min - 0.5)
      const [box] = boxes
      if (!isShown || !box || box.width === 0 || isLarge) return []
      const name = control.getAttribute('aria-label') ?? control.textContent ?? control.tagName
      return [`${name.trim()}: ${Math.round(box.width)} × ${Math.round(box.height)}`]
    })
  }, minPx)

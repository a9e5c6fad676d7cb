import { space, useWidth } from '@/components/theme'

/** Beyond this a row of a table can no longer be followed across. */
export const WIDEST_PX = 2200

export type PageMeasure = Readonly<{
  marginPx: number
  /** Width inside the margins, known before anything is drawn, so that a score need not wait to be measured. */
  contentPx: number
  /** Width of the margin for rubrics beside the content, its gap included; 0 where it goes below. */
  besidePx: number
}>

const BESIDE_PX = 380
const BESIDE_GAP_PX = space.triple

/** Margins and measure of a page. */
export function usePageMeasure(): PageMeasure {
  const { isWide, widthPx } = useWidth()
  const marginPx = widthPx >= 1600 ? 56 : isWide ? space.double : widthPx < 360 ? space.half : space.one
  return {
    marginPx,
    contentPx: Math.min(WIDEST_PX, widthPx - 2 * marginPx),
    besidePx: isWide ? BESIDE_PX + BESIDE_GAP_PX : 0,
  }
}

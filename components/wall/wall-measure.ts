/** The wall as it is drawn at 1920 by 1080; other screens are this, larger or smaller. */
const DRAWN = {
  widthPx: 1920,
  heightPx: 1080,
  marginPx: 56,
  headerPx: 96,
  footerPx: 190,
  asidePx: 384,
  gapPx: 44,
}

/** Below this width the parts stand under each other, and the page scrolls. */
const STACKED_BELOW_PX = 900

export type WallMeasure = Readonly<{
  /** By how much everything is larger than drawn. */
  scale: number
  isStacked: boolean
  marginPx: number
  headerPx: number
  footerPx: number
  asidePx: number
  gapPx: number
  scoreWidthPx: number
  scoreHeightPx: number
  /** A size of type, or any length drawn at 1920, on this screen. */
  px: (drawn: number) => number
}>

/** Type of the margin as drawn at 1920. */
export const MARGIN_TYPE = { sizePx: 27, linePx: 35, squarePx: 196, paddingPx: 56, gapPx: 26, namesPx: 250 }

/** How many lines of rubrics the margin holds beside the square and the names. A letter of the sans takes some two fifths of its size. */
export function marginRoom(
  { isStacked, scoreHeightPx, asidePx, px }: WallMeasure,
  hasSquare: boolean,
  hasNames: boolean,
): Readonly<{ lines: number; letters: number }> {
  if (isStacked) return { lines: 16, letters: 38 }
  const { sizePx, linePx, squarePx, paddingPx, gapPx, namesPx } = MARGIN_TYPE
  const taken = 1.5 * paddingPx + (hasSquare ? squarePx + gapPx : 0) + (hasNames ? namesPx : 0) + linePx
  return {
    lines: Math.floor((scoreHeightPx - px(taken)) / px(linePx)),
    letters: Math.floor(asidePx / (px(sizePx) * 0.42)),
  }
}

/** Lays the wall out for a screen. The score gets all that header, footer and margin leave. */
export function measureWall(widthPx: number, heightPx: number): WallMeasure {
  const isStacked = widthPx < STACKED_BELOW_PX
  const fit = Math.min(widthPx / DRAWN.widthPx, heightPx / DRAWN.heightPx)
  const scale = isStacked ? 0.62 : Math.max(0.55, fit)
  const px = (drawn: number): number => Math.round(drawn * scale)
  const marginPx = isStacked ? 16 : px(DRAWN.marginPx)
  const headerPx = px(DRAWN.headerPx)
  const footerPx = px(DRAWN.footerPx)
  const asidePx = px(DRAWN.asidePx)
  const gapPx = isStacked ? 20 : px(DRAWN.gapPx)
  return {
    scale,
    isStacked,
    marginPx,
    headerPx,
    footerPx,
    asidePx,
    gapPx,
    scoreWidthPx: isStacked ? widthPx - 2 * marginPx : widthPx - 2 * marginPx - asidePx - gapPx,
    scoreHeightPx: heightPx - headerPx - footerPx,
    px,
  }
}

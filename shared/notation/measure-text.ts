import { FACE_WIDTHS, type FaceName } from '@/shared/notation/text-widths'

const ELLIPSIS = '…'
const LEAST_LETTERS = 3

const advancesOf = (face: FaceName): ReadonlyMap<string, number> =>
  new Map([...FACE_WIDTHS[face].characters].map((c, i) => [c, FACE_WIDTHS[face].advances[i] as number]))

const ADVANCES: Readonly<Record<FaceName, ReadonlyMap<string, number>>> = {
  Alegreya: advancesOf('Alegreya'),
  AlegreyaItalic: advancesOf('AlegreyaItalic'),
  AlegreyaSans: advancesOf('AlegreyaSans'),
  AlegreyaSansMedium: advancesOf('AlegreyaSansMedium'),
}

/** A letter of another script is drawn by a fallback font, seldom wider than this many thousandths of an em. */
const UNKNOWN_ADVANCE = 1050

/** Width of a text in px. Kerning is left out, so it is never too small by more than a hair. */
export function measureTextPx(text: string, face: FaceName, sizePx: number): number {
  let thousandths = 0
  for (const character of text) thousandths += ADVANCES[face].get(character) ?? UNKNOWN_ADVANCE
  return (thousandths * sizePx) / 1000
}

/** Height above and depth below the baseline in px: of figures alone when a text has nothing else. */
export function textHeightPx(text: string, face: FaceName, sizePx: number): { above: number; below: number } {
  const { digitTop, ascent, descent } = FACE_WIDTHS[face]
  const isFigures = /^\d*$/.test(text)
  return {
    above: ((isFigures ? digitTop : ascent) * sizePx) / 1000,
    below: ((isFigures ? 12 : descent) * sizePx) / 1000,
  }
}

/** The text, or its beginning with an ellipsis where it is too long, or '' where fewer than three letters would be left. */
export function ellipsise(text: string, face: FaceName, sizePx: number, widthPx: number): string {
  if (measureTextPx(text, face, sizePx) <= widthPx) return text
  const letters = [...text]
  let used = measureTextPx(ELLIPSIS, face, sizePx)
  let kept = 0
  for (const letter of letters) {
    used += measureTextPx(letter, face, sizePx)
    if (used > widthPx) break
    kept += 1
  }
  return kept < LEAST_LETTERS ? '' : letters.slice(0, kept).join('').trimEnd() + ELLIPSIS
}

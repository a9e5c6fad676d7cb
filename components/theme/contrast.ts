/** Relative luminance of `#RRGGBB`, 0 to 1. Source: WCAG 2.2, "relative luminance". */
export function luminanceOf(hex: string): number {
  const channel = (from: number) => {
    const value = Number.parseInt(hex.slice(from, from + 2), 16) / 255
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4
  }
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5)
}

/** Contrast ratio of two colours, 1 to 21. `contrastOf('#000000', '#FFFFFF')` is 21. Source: WCAG 2.2, "contrast ratio". */
export function contrastOf(a: string, b: string): number {
  const [lighter, darker] = [luminanceOf(a), luminanceOf(b)].sort((x, y) => y - x) as [number, number]
  return (lighter + 0.05) / (darker + 0.05)
}

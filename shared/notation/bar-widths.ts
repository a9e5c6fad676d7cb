/** A bar as the spacing sees it: the width it cannot do without, and its share of what is left. */
export type ElasticBar = Readonly<{ leastPx: number; weight: number }>

/**
 * Widths that add up to `totalPx`, in proportion to the weights, none below its least. With too little room every bar
 * has its least and the sum is larger than asked.
 */
export function stretchBars(bars: readonly ElasticBar[], totalPx: number): readonly number[] {
  const isFixed = bars.map((bar) => bar.weight === 0)
  for (;;) {
    const fixedPx = bars.reduce((sum, bar, i) => sum + (isFixed[i] ? bar.leastPx : 0), 0)
    const weight = bars.reduce((sum, bar, i) => sum + (isFixed[i] ? 0 : bar.weight), 0)
    const unitPx = weight > 0 ? (totalPx - fixedPx) / weight : 0
    const short = bars.findIndex((bar, i) => !isFixed[i] && bar.weight * unitPx < bar.leastPx)
    if (short === -1) return bars.map((bar, i) => (isFixed[i] ? bar.leastPx : bar.weight * unitPx))
    // Every bar that falls short keeps its least, and the rest share what remains.
    bars.forEach((bar, i) => {
      if (!isFixed[i] && bar.weight * unitPx < bar.leastPx) isFixed[i] = true
    })
  }
}

/**
 * Cuts natural widths into as few systems as they need, filled as evenly as can be (the cut with the least sum of
 * squared empty shares). Returns the index of each system's first bar.
 */
export function breakSystems(naturalPx: readonly number[], availablePx: number): readonly number[] {
  const count = naturalPx.length
  type Cut = Readonly<{ systems: number; cost: number; from: number }>
  const best: Cut[] = [{ systems: 0, cost: 0, from: 0 }]
  for (let end = 1; end <= count; end++) {
    let chosen: Cut | null = null
    let width = 0
    for (let from = end - 1; from >= 0; from--) {
      width += naturalPx[from] as number
      if (width > availablePx && from < end - 1) break
      const before = best[from] as Cut
      const empty = 1 - Math.min(1, width / availablePx)
      const cut = { systems: before.systems + 1, cost: before.cost + empty * empty, from }
      if (
        !chosen ||
        cut.systems < chosen.systems ||
        (cut.systems === chosen.systems && cut.cost < chosen.cost)
      )
        chosen = cut
    }
    best.push(chosen as Cut)
  }
  const starts: number[] = []
  for (let end = count; end > 0; end = (best[end] as Cut).from) starts.unshift((best[end] as Cut).from)
  return starts
}

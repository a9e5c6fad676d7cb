/**
 * A bar as the spacing sees it: the width it cannot do without, what accidentals and the closing line add beside the
 * notes, and its share of the rest. Notes then stand evenly, whatever hangs on them.
 */
export type ElasticBar = Readonly<{ leastPx: number; extraPx: number; weight: number }>

/**
 * Widths that add up to `totalPx`, in proportion to the weights, none below its least. With too little room every bar
 * has its least and the sum is larger than asked. A bar without weight is never stretched.
 */
export function stretchBars(bars: readonly ElasticBar[], totalPx: number): readonly number[] {
  const isFixed = bars.map((bar) => bar.weight === 0)
  for (;;) {
    let takenPx = 0
    let weight = 0
    bars.forEach((bar, i) => {
      takenPx += isFixed[i] ? bar.leastPx : bar.extraPx
      weight += isFixed[i] ? 0 : bar.weight
    })
    const unitPx = weight > 0 ? (totalPx - takenPx) / weight : 0
    const widths = bars.map((bar, i) => (isFixed[i] ? bar.leastPx : bar.extraPx + bar.weight * unitPx))
    // Every bar that falls short keeps its least, and the rest share what remains.
    let isShort = false
    bars.forEach((bar, i) => {
      if ((widths[i] as number) >= bar.leastPx) return
      isFixed[i] = true
      isShort = true
    })
    if (!isShort) return widths
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

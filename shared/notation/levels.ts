/** A span of bars, ends included. */
export type BarSpan = Readonly<{ fromBar: number; toBar: number }>

/**
 * The level of each span, 0 nearest the staff, so that no two on one level meet: short ones lie inside, long ones over
 * them. `mayShareEnds` lets two that only meet in a bar stand on one level.
 */
export function assignLevels(
  spans: readonly BarSpan[],
  mayShareEnds: (a: BarSpan, b: BarSpan) => boolean,
): readonly number[] {
  const levels = new Map<number, number>()
  const order = spans
    .map((_, i) => i)
    .sort((a, b) => {
      const [first, second] = [spans[a] as BarSpan, spans[b] as BarSpan]
      return (
        first.toBar - first.fromBar - (second.toBar - second.fromBar) ||
        first.fromBar - second.fromBar ||
        a - b
      )
    })
  const isMeeting = (a: BarSpan, b: BarSpan): boolean =>
    mayShareEnds(a, b)
      ? a.fromBar < b.toBar && b.fromBar < a.toBar
      : a.fromBar <= b.toBar && b.fromBar <= a.toBar
  for (const i of order) {
    const span = spans[i] as BarSpan
    let level = 0
    while ([...levels].some(([other, taken]) => taken === level && isMeeting(span, spans[other] as BarSpan)))
      level += 1
    levels.set(i, level)
  }
  return spans.map((_, i) => levels.get(i) as number)
}

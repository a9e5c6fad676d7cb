import { useEffect, useMemo, useRef } from 'react'

/**
 * A ranked list that holds still while somebody is about to press something in it: what stood keeps its place, what is new
 * comes after it. Let go, it is in its own order again.
 */
export function useSteadyOrder<Item extends Readonly<{ key: string }>>(
  ranked: readonly Item[],
  isHeld: boolean,
): readonly Item[] {
  const stood = useRef<ReadonlyMap<string, number>>(new Map())
  const ordered = useMemo(() => {
    if (!isHeld) return ranked
    const placeOf = ({ key }: Item): number => stood.current.get(key) ?? stood.current.size
    return [...ranked].sort((a, b) => placeOf(a) - placeOf(b))
  }, [ranked, isHeld])
  useEffect(() => {
    stood.current = new Map(ordered.map(({ key }, index) => [key, index]))
  }, [ordered])
  return ordered
}

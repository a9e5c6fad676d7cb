import { Children, useLayoutEffect, useRef, type CSSProperties, type ReactNode } from 'react'
import { MOTION_MS, useTheme } from '@/components/theme'

const STACK: CSSProperties = { position: 'relative' }
const PLACE: CSSProperties = { position: 'absolute', left: 0, right: 0, top: 0 }

/**
 * Children under each other, each slid to its place rather than laid out there: when one grows, comes or changes its rank,
 * the others are eased along and nothing jumps. Children need keys. Whatever may be read after the stack belongs in it.
 */
export function EasedStack({ gapPx = 0, children }: Readonly<{ gapPx?: number; children: ReactNode }>) {
  const { isMotionReduced } = useTheme()
  const stack = useRef<HTMLDivElement>(null)
  const placed = useRef(new WeakSet<Element>())

  const place = () => {
    const element = stack.current
    if (!element) return
    const places = Array.from(element.children) as HTMLElement[]
    // All are measured before any is moved, so that the browser lays them out once.
    const heights = places.map(({ offsetHeight }) => offsetHeight)
    let top = 0
    places.forEach((each, index) => {
      const isKnown = placed.current.has(each)
      each.style.transition = isKnown && !isMotionReduced ? `transform ${MOTION_MS}ms ease-out` : 'none'
      each.style.transform = `translateY(${top}px)`
      placed.current.add(each)
      const height = heights[index] ?? 0
      if (height > 0) top += height + gapPx
    })
    element.style.height = `${Math.max(0, top - gapPx)}px`
  }
  const latestPlace = useRef(place)
  latestPlace.current = place

  const observer = useRef<ResizeObserver | null>(null)
  const watched = useRef(new Set<Element>())
  useLayoutEffect(() => {
    observer.current = new ResizeObserver(() => latestPlace.current())
    const seen = watched.current
    return () => {
      observer.current?.disconnect()
      seen.clear()
    }
  }, [])
  useLayoutEffect(() => {
    const places = new Set<Element>(Array.from(stack.current?.children ?? []))
    for (const each of places) if (!watched.current.has(each)) observer.current?.observe(each)
    for (const each of watched.current) if (!places.has(each)) observer.current?.unobserve(each)
    watched.current = places
    place()
  })

  return (
    <div ref={stack} style={STACK}>
      {Children.map(children, (child) => (child === null ? null : <div style={PLACE}>{child}</div>))}
    </div>
  )
}

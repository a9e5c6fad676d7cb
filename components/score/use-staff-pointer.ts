import { useCallback, useMemo, useRef, useState } from 'react'
import { staffPitchAt, type StaffHit } from '@/shared/notation/hit-test'
import type { ScoreLayout } from '@/shared/notation/score-layout'
import type { PitchName } from '@/shared/theory/pitch'

type WebPointer = Readonly<{
  nativeEvent: Readonly<{ clientX: number; clientY: number; pointerType: string; button: number }>
  currentTarget: unknown
}>

type StaffPointer = Readonly<{
  ghost: StaffHit | null
  isHeld: boolean
  /** Handlers for the view whose corner is the score's. */
  handlers: object
  /** True once for a press that the staff has already taken, so that the bar under it leaves it alone. */
  takePress: () => boolean
}>

function pointIn(event: WebPointer): { x: number; y: number } {
  const box = (event.currentTarget as HTMLElement).getBoundingClientRect()
  return { x: event.nativeEvent.clientX - box.left, y: event.nativeEvent.clientY - box.top }
}

/** Mouse, pen and finger on the staff: a ghost follows, a drag corrects, letting go chooses the pitch. */
export function useStaffPointer(
  layout: ScoreLayout,
  onPressStaff: ((bar: number, pitch: PitchName) => void) | undefined,
  isBarOpen: (bar: number) => boolean,
): StaffPointer {
  const [ghost, setGhost] = useState<StaffHit | null>(null)
  const [isHeld, setHeld] = useState(false)
  const held = useRef(false)
  const taken = useRef(false)

  const hitAt = useCallback(
    (event: WebPointer): StaffHit | null => {
      const { x, y } = pointIn(event)
      const hit = staffPitchAt(layout, x, y)
      return hit && isBarOpen(hit.bar) ? hit : null
    },
    [layout, isBarOpen],
  )

  const handlers = useMemo(() => {
    if (!onPressStaff) return {}
    const show = (hit: StaffHit | null): void =>
      setGhost((before) => (before?.bar === hit?.bar && before?.pitch === hit?.pitch ? before : hit))
    const hold = (isNow: boolean): void => {
      held.current = isNow
      setHeld(isNow)
    }
    return {
      onPointerMove: (event: WebPointer) => {
        // A finger that hovers is scrolling.
        if (event.nativeEvent.pointerType !== 'touch' || held.current) show(hitAt(event))
      },
      onPointerDown: (event: WebPointer) => {
        taken.current = false
        if (event.nativeEvent.button !== 0) return
        const hit = hitAt(event)
        show(hit)
        hold(hit !== null)
      },
      onPointerUp: (event: WebPointer) => {
        const hit = held.current ? hitAt(event) : null
        hold(false)
        if (event.nativeEvent.pointerType === 'touch') show(null)
        if (!hit) return
        taken.current = true
        onPressStaff(hit.bar, hit.pitch)
      },
      onPointerCancel: () => {
        hold(false)
        show(null)
      },
      onPointerLeave: () => {
        hold(false)
        show(null)
      },
    }
  }, [hitAt, onPressStaff])

  const takePress = useCallback((): boolean => {
    const was = taken.current
    taken.current = false
    return was
  }, [])

  return { ghost, isHeld, handlers, takePress }
}

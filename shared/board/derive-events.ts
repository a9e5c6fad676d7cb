import type { BoardState } from './board-state'
import type { BoardEvent } from './event'
import { isSameNotes } from './group-proposals'

/** Whether two plain JSON values are equal, whatever the order of their keys. */
function isSameValue(a: unknown, b: unknown): boolean {
  if (a === b) return true
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false
  if (Array.isArray(a) !== Array.isArray(b)) return false
  const [left, right] = [a as Record<string, unknown>, b as Record<string, unknown>]
  const keys = new Set([...Object.keys(left), ...Object.keys(right)])
  return [...keys].every((key) => isSameValue(left[key], right[key]))
}

/** What happened between two states of a board. The room's spread follows from the rest and is no event. */
export function deriveBoardEvents(before: BoardState | null, after: BoardState): readonly BoardEvent[] {
  if (before === after) return []
  const events: BoardEvent[] = []
  if (!before) events.push({ kind: 'board-laid', exercise: after.exercise, stage: after.stage })
  else {
    if (!isSameValue(before.exercise, after.exercise)) {
      events.push({ kind: 'exercise-changed', exercise: after.exercise })
    }
    if (!isSameValue(before.stage, after.stage)) events.push({ kind: 'stage-changed', stage: after.stage })
  }
  for (const bar of Object.keys(after.bars).map(Number)) events.push(...barEvents(before, after, bar))
  const ids = new Set([...Object.keys(before?.gestures ?? {}), ...Object.keys(after.gestures)])
  for (const id of ids) {
    const gesture = after.gestures[id]
    if (!gesture) events.push({ kind: 'gesture-erased', id })
    else if (!isSameValue(before?.gestures[id], gesture)) events.push({ kind: 'gesture-drawn', id, gesture })
  }
  return events
}

function barEvents(before: BoardState | null, after: BoardState, bar: number): readonly BoardEvent[] {
  const events: BoardEvent[] = []
  const now = after.bars[bar] as BoardState['bars'][number]
  const then = before?.bars[bar] ?? { state: 'frozen', setAside: false, round: 1 }
  if (now.round !== then.round) events.push({ kind: 'room-cleared', bar, round: now.round })
  if (now.state !== then.state) {
    events.push({ kind: now.state === 'released' ? 'bar-released' : 'bar-frozen', bar })
  }
  if (now.setAside !== then.setAside) {
    events.push({ kind: now.setAside ? 'bar-set-aside' : 'bar-taken-up', bar })
  }
  const [notes, former] = [after.line[bar], before?.line[bar]]
  if (notes && !(former && isSameNotes(notes, former))) {
    events.push({ kind: 'adopted', bar, notes: [...notes] as BoardEventNotes })
  } else if (!notes && former) events.push({ kind: 'taken-back', bar })
  return events
}

type BoardEventNotes = Extract<BoardEvent, { kind: 'adopted' }>['notes']

/**
 * The acts of the lectern, each one transaction of the board document. What is taken away is written as `null` instead
 * of being deleted: only then does the document's clock advance, and the act can be acknowledged as kept.
 */
import type * as Y from 'yjs'
import { fail, ok, type Result } from '@/shared/result'
import type { BarNotes } from '@/shared/theory/note'
import { barStateSchema, type BarState, type Gesture, type StageSettings } from '@/shared/wire/documents'
import { INITIAL_BAR, type BoardState } from './board-state'
import { parseValue } from './parse-value'
import { isGestureSpan, readBoard } from './read-board'

const copyNotes = (notes: BarNotes): BarNotes =>
  notes.map(({ pitch, ticks, tied }) => (tied ? { pitch, ticks, tied } : { pitch, ticks }))

/** Changes the state of the bars that exist and would be different for it. */
function changeBars(doc: Y.Doc, bars: readonly number[], change: (state: BarState) => BarState): void {
  const board = readBoard(doc)
  if (!board) return
  const map = doc.getMap<unknown>('bars')
  doc.transact(() => {
    for (const bar of bars) {
      if (!board.bars[bar]) continue
      const before = parseValue(barStateSchema, map.get(String(bar))) ?? INITIAL_BAR
      const after = change(before)
      const isSame =
        before.state === after.state && before.setAside === after.setAside && before.round === after.round
      if (!isSame) map.set(String(bar), after)
    }
  })
}

/** Opens bars to proposals. */
export const releaseBars = (doc: Y.Doc, bars: readonly number[]): void =>
  changeBars(doc, bars, (state) => ({ ...state, state: 'released' }))

/** Closes bars: what stands there stays, what is written from now on stays a draft on its sheet. */
export const freezeBars = (doc: Y.Doc, bars: readonly number[]): void =>
  changeBars(doc, bars, (state) => ({ ...state, state: 'frozen' }))

/** Takes bars out of the reading, so that the rest is read, judged and played as a reduction. */
export const setBarsAside = (doc: Y.Doc, bars: readonly number[]): void =>
  changeBars(doc, bars, (state) => ({ ...state, setAside: true }))

export const takeBarsUp = (doc: Y.Doc, bars: readonly number[]): void =>
  changeBars(doc, bars, (state) => ({ ...state, setAside: false }))

/** Begins another round in the bars: standing proposals leave the chorus and stay on their sheets as drafts. */
export const clearRoom = (doc: Y.Doc, bars: readonly number[]): void =>
  changeBars(doc, bars, (state) => ({ ...state, round: state.round + 1 }))

/** Makes notes the class's own, by bar number, and freezes those bars. */
export function adoptBars(doc: Y.Doc, adopted: Readonly<Record<number, BarNotes>>): void {
  const board = readBoard(doc)
  if (!board) return
  const bars = Object.keys(adopted)
    .map(Number)
    .filter((bar) => board.bars[bar])
  doc.transact(() => {
    const line = doc.getMap<unknown>('line')
    for (const bar of bars) line.set(String(bar), { notes: copyNotes(adopted[bar] as BarNotes) })
    freezeBars(doc, bars)
  })
}

/** Takes adopted notes out of the line again. The bars stay frozen until they are released. */
export function takeBackBars(doc: Y.Doc, bars: readonly number[]): void {
  const line = doc.getMap<unknown>('line')
  doc.transact(() => {
    for (const bar of bars) if (line.get(String(bar)) != null) line.set(String(bar), null)
  })
}

/** Changes what the class is told and shown; settings that are left out stay. */
export function updateStage(doc: Y.Doc, patch: Partial<StageSettings>): void {
  const board = readBoard(doc)
  if (board) doc.getMap<unknown>('stage').set('value', { ...board.stage, ...patch })
}

/** Names a span of three bars or more. The caller gives the id, which no other gesture has. */
export function drawGesture(
  doc: Y.Doc,
  id: string,
  gesture: Gesture,
): Result<null, 'too-short' | 'no-such-bar' | 'no-board'> {
  const board = readBoard(doc)
  if (!board) return fail('no-board')
  const bars = board.exercise.cantus.length
  if (gesture.from < 1 || gesture.to > bars) return fail('no-such-bar')
  if (!isGestureSpan(gesture, bars)) return fail('too-short')
  doc.getMap<unknown>('gestures').set(id, { ...gesture })
  return ok(null)
}

export function eraseGesture(doc: Y.Doc, id: string): void {
  const gestures = doc.getMap<unknown>('gestures')
  if (gestures.get(id) != null) gestures.set(id, null)
}

/** Writes a whole state into an empty document. */
export function writeBoardState(doc: Y.Doc, state: BoardState): void {
  doc.transact(() => {
    doc.getMap<unknown>('exercise').set('value', structuredCopy(state.exercise))
    doc.getMap<unknown>('stage').set('value', { ...state.stage })
    const maps = { bars: state.bars, gestures: state.gestures, spread: state.spread }
    for (const [name, values] of Object.entries(maps)) {
      for (const [key, value] of Object.entries(values)) {
        doc.getMap<unknown>(name).set(key, structuredCopy(value))
      }
    }
    for (const [bar, notes] of Object.entries(state.line)) {
      doc.getMap<unknown>('line').set(bar, { notes: copyNotes(notes) })
    }
  })
}

/** A deep copy without `undefined`, which a document cannot hold. */
const structuredCopy = (value: unknown): unknown => JSON.parse(JSON.stringify(value)) as unknown

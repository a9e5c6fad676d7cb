import type * as Y from 'yjs'
import {
  adoptedBarSchema,
  barStateSchema,
  exerciseSchema,
  gestureSchema,
  spreadSchema,
  stageSchema,
  type Gesture,
} from '@/shared/wire/documents'
import { barsOf, INITIAL_BAR, INITIAL_STAGE, type BoardState } from './board-state'
import { parseValue, readBars, readEntries } from './parse-value'

/** Fewest bars of a gesture: a span of two notes is only an interval. */
export const MIN_GESTURE_BARS = 3

/** Whether a gesture spans bars that exist, and enough of them. */
export const isGestureSpan = ({ from, to }: Pick<Gesture, 'from' | 'to'>, bars: number): boolean =>
  from >= 1 && to <= bars && to - from + 1 >= MIN_GESTURE_BARS

/** The board as plain values, or null while it has no exercise (nothing has arrived yet). Never throws. */
export function readBoard(doc: Y.Doc): BoardState | null {
  const exercise = parseValue(exerciseSchema, doc.getMap('exercise').get('value'))
  if (!exercise) return null
  const numbers = barsOf(exercise)
  const states = readBars(doc, 'bars', barStateSchema)
  const adopted = readBars(doc, 'line', adoptedBarSchema)
  const spreads = readBars(doc, 'spread', spreadSchema)
  const line: Record<number, BoardState['line'][number]> = {}
  const spread: Record<number, BoardState['spread'][number]> = {}
  for (const bar of numbers) {
    if (adopted[bar]) line[bar] = adopted[bar].notes
    if (spreads[bar]) spread[bar] = spreads[bar]
  }
  return {
    exercise,
    bars: Object.fromEntries(numbers.map((bar) => [bar, states[bar] ?? INITIAL_BAR])),
    line,
    gestures: Object.fromEntries(
      readEntries(doc, 'gestures', gestureSchema).filter(([, span]) => isGestureSpan(span, numbers.length)),
    ),
    stage: parseValue(stageSchema, doc.getMap('stage').get('value')) ?? INITIAL_STAGE,
    spread,
  }
}

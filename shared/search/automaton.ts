/** The walk has not asked yet. */
export const UNKNOWN = -2
/** A law is broken. */
export const DEAD = -1

/**
 * Laws as a machine over places: its states at a place are small numbers, and the table of a place says where each
 * choice leads from each state. Tables fill as they are asked, and are kept: what a rule says of a note after another
 * does not change while a question is asked again with other notes fixed.
 */
export type Automaton = Readonly<{
  /** State at the first place, 0 always. */
  start: () => void
  /** Transitions at a place by state and choice; valid until states are added to the place. */
  tableAt: (place: number) => Int32Array
  /** Works a transition out, and writes it in the table of its place. */
  advance: (place: number, state: number, choice: number) => number
  /** Whether a line may end in a state. */
  accepts: (state: number) => boolean
  /** Names the rules that refuse a choice in a state, or the end when there is no choice. */
  blame: (place: number, state: number, choice: number | null, say: (ruleId: string) => void) => void
}>

/** A growing table of transitions at one place. */
export function growTable(known: Int32Array | undefined, length: number): Int32Array {
  if (known !== undefined && known.length >= length) return known
  const grown = new Int32Array(Math.max(length, 2 * (known?.length ?? 0))).fill(UNKNOWN)
  if (known !== undefined) grown.set(known)
  return grown
}

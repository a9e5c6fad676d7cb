const FIRST_SLOTS = 64

/**
 * Gives small numbers to tuples of small numbers, each tuple one number, in the order in which they are met: an open
 * hash over flat arrays, since a search meets hundreds of thousands of them and must not allocate for any.
 */
export type TupleTable = {
  /** How many tuples are known. */
  count: number
  /** The tuples, one after the other. */
  values: Int32Array
  slots: Int32Array
}

export const createTupleTable = (width: number): TupleTable => ({
  count: 0,
  values: new Int32Array((FIRST_SLOTS / 2) * width),
  slots: new Int32Array(FIRST_SLOTS).fill(-1),
})

/** The number of a tuple of `width` fields; a new one when it has not been met before. */
export function internTuple(table: TupleTable, tuple: Int32Array, width: number): number {
  const { slots, values } = table
  const mask = slots.length - 1
  let slot = hashOf(tuple, 0, width) & mask
  for (;;) {
    const id = slots[slot] as number
    if (id < 0) break
    const from = id * width
    let field = 0
    while (field < width && values[from + field] === tuple[field]) field += 1
    if (field === width) return id
    slot = (slot + 1) & mask
  }
  const id = table.count
  if (2 * (id + 1) > slots.length) {
    grow(table, width)
    return internTuple(table, tuple, width)
  }
  slots[slot] = id
  for (let field = 0; field < width; field += 1) values[id * width + field] = tuple[field] as number
  table.count = id + 1
  return id
}

/** Forgets all tuples from number `count` on. */
export function truncateTuples(table: TupleTable, count: number, width: number): void {
  if (table.count === count) return
  table.count = count
  rehash(table, width)
}

function grow(table: TupleTable, width: number): void {
  const values = new Int32Array(table.slots.length * width)
  values.set(table.values)
  table.values = values
  table.slots = new Int32Array(2 * table.slots.length)
  rehash(table, width)
}

function rehash({ slots, values, count }: TupleTable, width: number): void {
  const mask = slots.length - 1
  slots.fill(-1)
  for (let id = 0; id < count; id += 1) {
    let slot = hashOf(values, id * width, width) & mask
    while ((slots[slot] as number) >= 0) slot = (slot + 1) & mask
    slots[slot] = id
  }
}

function hashOf(values: Int32Array, from: number, width: number): number {
  let hash = 0x9e3779b9
  for (let field = 0; field < width; field += 1) {
    hash = Math.imul(hash ^ (values[from + field] as number), 0x85ebca6b)
    hash ^= hash >>> 13
  }
  return hash ^ (hash >>> 16)
}

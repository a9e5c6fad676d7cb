/** Runs work of one key in turn, so that a burst of tries is counted one by one. Work of other keys is not held up. */
export function createKeyedQueue(mostWaiting: number) {
  const tails = new Map<string, { last: Promise<unknown>; waiting: number }>()
  return async <Value>(key: string, work: () => Promise<Value>): Promise<Value | 'crowded'> => {
    const tail = tails.get(key) ?? { last: Promise.resolve(), waiting: 0 }
    if (tail.waiting >= mostWaiting) return 'crowded'
    tail.waiting += 1
    tails.set(key, tail)
    const mine = tail.last.then(work, work)
    tail.last = mine.catch(() => {})
    try {
      return await mine
    } finally {
      tail.waiting -= 1
      if (tail.waiting === 0) tails.delete(key)
    }
  }
}

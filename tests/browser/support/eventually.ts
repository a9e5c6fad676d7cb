import { setTimeout as wait } from 'node:timers/promises'

const PATIENCE_MS = 10_000
const POLL_MS = 40

/** Reads until the reading passes `isSo`, and gives it; throws with the last reading when it never does. */
export async function eventually<Value>(
  what: string,
  read: () => Promise<Value>,
  isSo: (value: Value) => boolean,
): Promise<Value> {
  const deadlineMs = Date.now() + PATIENCE_MS
  for (;;) {
    const value = await read()
    if (isSo(value)) return value
    if (Date.now() > deadlineMs)
      throw new Error(`${what}: never came. The last that was seen: ${String(value)}`)
    await wait(POLL_MS)
  }
}

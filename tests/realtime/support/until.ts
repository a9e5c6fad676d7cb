const POLL_MS = 5
const PATIENCE_MS = 20_000

/** Waits for a condition; never for a time. Fails, naming what it waited for, when the condition does not come. */
export async function until(condition: () => boolean | Promise<boolean>, what = ''): Promise<void> {
  const deadline = Date.now() + PATIENCE_MS
  while (!(await condition())) {
    if (Date.now() > deadline) throw new Error(`Waited in vain for ${what || condition.toString()}`)
    await new Promise((resolve) => setTimeout(resolve, POLL_MS))
  }
}

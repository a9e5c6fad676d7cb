/** What is said to the person at the terminal when something stands in the way; no stack is shown. */
export class SetUpError extends Error {}

/** Names a step, does it, says how long it took. `work` gets a function that says more on lines of their own. */
export async function step(label, work) {
  const startedAt = process.hrtime.bigint()
  let hasSaid = false
  const say = (line) => {
    process.stdout.write(`${hasSaid ? '' : '\n'}    ${line}\n`)
    hasSaid = true
  }
  process.stdout.write(`  ${label} …`)
  try {
    const value = await work(say)
    const seconds = Number(process.hrtime.bigint() - startedAt) / 1e9
    process.stdout.write(`${hasSaid ? `  ${label}:` : ''} ${seconds.toFixed(1)} s\n`)
    return value
  } catch (error) {
    process.stdout.write(`${hasSaid ? `  ${label}:` : ''} failed\n`)
    throw error
  }
}

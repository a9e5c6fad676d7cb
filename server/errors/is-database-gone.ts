/** SQLSTATE classes: connection trouble, no resources (a full disk among them), the server going down or coming up. */
const GONE_CLASSES = ['08', '53', '57']
const GONE_CODES = ['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', 'ENOTFOUND']
const GONE_MESSAGES = /Connection terminated|timeout exceeded when trying to connect|Query read timeout/i

/** Whether an error says that the database cannot be reached or cannot keep anything, rather than that we erred. */
export function isDatabaseGone(error: unknown): boolean {
  if (!(error instanceof Error)) return false
  const code = String((error as { code?: unknown }).code ?? '')
  return (
    GONE_CODES.includes(code) ||
    (/^[0-9A-Z]{5}$/.test(code) && GONE_CLASSES.includes(code.slice(0, 2))) ||
    GONE_MESSAGES.test(error.message) ||
    (error instanceof AggregateError && error.errors.some(isDatabaseGone))
  )
}

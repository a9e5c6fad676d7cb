/** SQLSTATE classes: connection trouble, no resources (a full disk among them), the server going down or coming up. */
const GONE_CLASSES = ['08', '53', '57']
const GONE_CODES = ['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', 'ENOTFOUND']
const GONE_MESSAGES = /Connection terminated|timeout exceeded when trying to connect|Query read timeout/i

type Told = Readonly<{ code?: unknown; message?: unknown; errors?: unknown }>

/** Whether an error says that the database cannot be reached or cannot keep anything, rather than that we erred. */
export function isDatabaseGone(error: unknown): boolean {
  if (typeof error !== 'object' || error === null) return false
  const { code, message, errors } = error as Told
  const told = String(code ?? '')
  return (
    GONE_CODES.includes(told) ||
    (/^[0-9A-Z]{5}$/.test(told) && GONE_CLASSES.includes(told.slice(0, 2))) ||
    GONE_MESSAGES.test(String(message ?? '')) ||
    (Array.isArray(errors) && errors.some(isDatabaseGone))
  )
}

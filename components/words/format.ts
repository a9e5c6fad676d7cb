/** Dates, numbers and lists as the locale writes them. */
const LOCALE = 'en-GB'

const date = new Intl.DateTimeFormat(LOCALE, { day: 'numeric', month: 'long', year: 'numeric' })
const dateTime = new Intl.DateTimeFormat(LOCALE, {
  day: 'numeric',
  month: 'short',
  hour: '2-digit',
  minute: '2-digit',
})
const count = new Intl.NumberFormat(LOCALE)
const list = new Intl.ListFormat(LOCALE, { type: 'conjunction' })
const plural = new Intl.PluralRules(LOCALE)

/** `formatDate('2026-03-02T09:00:00Z')` is "2 March 2026". */
export const formatDate = (iso: string): string => date.format(new Date(iso))

/** `formatDateTime('2026-03-02T09:00:00Z')` is "2 Mar, 09:00" in London. */
export const formatDateTime = (iso: string): string => dateTime.format(new Date(iso))

/** A number with its noun: `formatCount(1, 'bar', 'bars')` is "1 bar". */
export const formatCount = (n: number, one: string, many: string): string =>
  `${count.format(n)} ${plural.select(n) === 'one' ? one : many}`

/** `formatList(['do', 're', 'mi'])` is "do, re and mi". */
export const formatList = (items: readonly string[]): string => list.format(items)

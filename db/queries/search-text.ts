import { sql, type RawBuilder } from 'kysely'

/** Text as a search compares it: lower case, without accents. The same folding as `foldedColumn` does in the database. */
export const foldText = (text: string): string =>
  text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')

export const foldedColumn = (column: string): RawBuilder<string> =>
  sql<string>`regexp_replace(normalize(lower(${sql.ref(column)}), NFKD), '[\u0300-\u036f]', '', 'g')`

/** A pattern that finds `text` anywhere, with nothing in it a wildcard. */
export const patternOf = (text: string): string => `%${foldText(text.trim()).replace(/[\\%_]/g, '\\$&')}%`

/** Order of names as readers of many languages expect it, whatever the server's own locale. */
export const readingOrder = (column: string): RawBuilder<string> =>
  sql<string>`${sql.ref(column)} collate "und-x-icu"`

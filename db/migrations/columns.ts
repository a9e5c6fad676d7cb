import { sql, type ColumnDefinitionBuilder } from 'kysely'

/** A time that the database fills in when the row is made. */
export const filledNow = (column: ColumnDefinitionBuilder): ColumnDefinitionBuilder =>
  column.notNull().defaultTo(sql`now()`)

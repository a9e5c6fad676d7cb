import type { ColumnType } from 'kysely'
import type { RuleSettings } from '@/shared/rule-sets/rule-set-file'

export interface RuleSetTable {
  id: string
  name: string
  /** The preset it was started from. */
  basedOn: string | null
  rules: ColumnType<RuleSettings, string, string>
  ownerId: string
  /** Course it is shared with. */
  courseId: string | null
  createdAt: ColumnType<Date, Date | undefined, never>
  updatedAt: ColumnType<Date, Date | undefined, Date>
}

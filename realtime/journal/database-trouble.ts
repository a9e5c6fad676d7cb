/** What kept the journal from taking a beat. */
export type Trouble = 'disk-full' | 'lesson-gone' | 'elsewhere' | 'refused' | 'database'

/** PostgreSQL's codes (appendix A of its manual) for what we can say more about than "not now". */
const TROUBLE_OF_CODE: Readonly<Record<string, Trouble>> = {
  '53100': 'disk-full',
  '23503': 'lesson-gone',
  // Somebody else wrote the same ordinal: another process holds this lesson, or held it when we wrote last.
  '23505': 'elsewhere',
}

/** Class of errors in the data itself. */
const DATA_EXCEPTION = '22'

export function parseTrouble(error: unknown): Trouble {
  const code = (error as { code?: unknown } | null)?.code
  if (typeof code !== 'string') return 'database'
  return TROUBLE_OF_CODE[code] ?? (code.startsWith(DATA_EXCEPTION) ? 'refused' : 'database')
}

/** Trouble of one lesson, which must not be another's: worth trying each by itself. */
export const isOfOneLesson = (trouble: Trouble): boolean =>
  trouble === 'lesson-gone' || trouble === 'elsewhere' || trouble === 'refused'

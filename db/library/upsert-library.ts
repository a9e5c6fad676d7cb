import type { Connection } from '@/db/connect'
import { FUX_CANTUS } from './fux'
import { INVENTED_CANTUS } from './invented'

/** The repertory that every school has. */
export const LIBRARY = [...FUX_CANTUS, ...INVENTED_CANTUS] as const

/** `F#4` is on F#. */
export const finalOf = (notes: string): string => notes.split(' ').at(-1)?.replace(/\d$/, '') ?? ''

/** Puts the library in, or brings it up to date. Run at every start. */
export async function upsertLibrary(db: Connection): Promise<void> {
  for (const { id, notes, ...cantus } of LIBRARY) {
    const row = { ...cantus, notes: JSON.stringify(notes.split(' ')), final: finalOf(notes) }
    await db
      .insertInto('cantus')
      .values({ id, ownerId: null, courseId: null, ...row })
      .onConflict((conflict) => conflict.column('id').doUpdateSet(row))
      .execute()
  }
}

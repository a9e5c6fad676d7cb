import type { FieldProblem } from '@/shared/api/errors'

const MARKS_IN_A_ROW = /\p{M}{4,}/u
/** Characters that show nothing, but for the joiners and the emoji selector that names and scripts do use. */
const INVISIBLE = /(?!\u200c|\u200d|\ufe0f)\p{Default_Ignorable_Code_Point}/u

const folded = (name: string) =>
  name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[^\p{L}\p{N}]/gu, '')
    .toLowerCase()

/**
 * What speaks against a guest's name, beside its length: it has to have a letter to be called by, no heap of accents
 * that climbs over its neighbours, nothing that cannot be seen, and it must not be the name of one who leads.
 */
export function guestNameProblem(name: string, leaders: readonly string[]): FieldProblem | null {
  if (INVISIBLE.test(name)) return { path: 'name', code: 'hidden-characters' }
  if (!/\p{L}|\p{N}/u.test(name)) return { path: 'name', code: 'no-letters' }
  if (MARKS_IN_A_ROW.test(name)) return { path: 'name', code: 'too-many-marks' }
  if (leaders.some((leader) => folded(leader) === folded(name))) return { path: 'name', code: 'taken' }
  return null
}

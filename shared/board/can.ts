import type { LessonRole } from '@/shared/api/lessons'

/** Somebody's part in a lesson; `nobody` is a visitor who is in none. */
export type Role = LessonRole | 'nobody'

const ROLES = ['teacher', 'assistant', 'student', 'guest', 'wall'] as const satisfies readonly LessonRole[]
const LEADERS: readonly Role[] = ['teacher', 'assistant']
const WRITERS: readonly Role[] = ['student', 'guest']
const PEOPLE: readonly Role[] = [...LEADERS, ...WRITERS]

/**
 * Every act of a lesson and who may do it. Asked at the socket, at the route and by the control on the screen, so that
 * none of them can be of another opinion.
 */
const TABLE = {
  'see board': ROLES,
  /** Any change of the board document: the acts below, down to `draw gesture`, are ways of it. */
  'write board': LEADERS,
  'release bars': LEADERS,
  'freeze bars': LEADERS,
  'set bars aside': LEADERS,
  adopt: LEADERS,
  'take back': LEADERS,
  'clear room': LEADERS,
  'change stage': LEADERS,
  'draw gesture': LEADERS,
  /** Write notes and marks on one's own sheet. */
  propose: WRITERS,
  'see own sheet': WRITERS,
  'see every sheet': LEADERS,
  'see chorus': [...LEADERS, 'wall'],
  /** The wall sees names only while the stage shows them. */
  'see names': LEADERS,
  'be counted': PEOPLE,
  'raise hand': WRITERS,
  'lower any hand': LEADERS,
  'cue wall': LEADERS,
  'hear cues': ['wall'],
  'remove member': LEADERS,
  'open door': LEADERS,
  'rename lesson': LEADERS,
  'link wall': LEADERS,
  'open lesson': LEADERS,
  'end lesson': LEADERS,
  'remove lesson': ['teacher'],
} as const satisfies Readonly<Record<string, readonly Role[]>>

export type Act = keyof typeof TABLE

export const ACTS = Object.keys(TABLE) as readonly Act[]

/** Whether a role may do an act. Whose sheet or which lesson is for the caller to have settled before. */
export const can = (role: Role, act: Act): boolean => (TABLE[act] as readonly Role[]).includes(role)

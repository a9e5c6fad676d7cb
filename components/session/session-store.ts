import { callApi, type Refusal } from '@/components/api'
import { api } from '@/shared/api'
import type { Me } from '@/shared/api/people'

export type Session = Readonly<{
  status: 'loading' | 'ready' | 'refused'
  me: Me | null
  isDemo: boolean
  refusal: Refusal | null
}>

/** Asked once a page, by whoever needs it first; told to everyone who asked. */
let session: Session = { status: 'loading', me: null, isDemo: false, refusal: null }
let underWay: Promise<void> | null = null
const listeners = new Set<() => void>()

const put = (next: Session) => {
  session = next
  for (const tell of listeners) tell()
}

/** Asks who is signed in, again when something has changed that. */
export function loadSession(): Promise<void> {
  underWay ??= callApi(api.people.me, {}).then((result) => {
    underWay = null
    put(
      result.ok
        ? { status: 'ready', me: result.value.me, isDemo: result.value.isDemo, refusal: null }
        : { ...session, status: session.me ? 'ready' : 'refused', refusal: result.reason },
    )
  })
  return underWay
}

export const readSession = (): Session => session

export function subscribeSession(tell: () => void): () => void {
  listeners.add(tell)
  if (session.status === 'loading') void loadSession()
  return () => listeners.delete(tell)
}

import { useSyncExternalStore } from 'react'
import { loadSession, readSession, subscribeSession, type Session } from './session-store'

/** Who is signed in on this page. Asks the server at first use. */
export function useSession(): Session & Readonly<{ reload: () => Promise<void> }> {
  const session = useSyncExternalStore(subscribeSession, readSession, readSession)
  return { ...session, reload: loadSession }
}

import { Redirect, usePathname } from 'expo-router'
import type { ReactNode } from 'react'
import { RefusedPage } from '@/components/api'
import { Loading, Page } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'
import { useSession } from './use-session'

/** Draws what needs a person with an account, and sends everyone else to sign in and back. */
export function SignedIn({ children }: Readonly<{ children: (me: Me, isDemo: boolean) => ReactNode }>) {
  const { status, me, isDemo, refusal, reload } = useSession()
  const path = usePathname()
  const words = useWords().common
  if (status === 'loading') {
    return (
      <Page title={words.product}>
        <Loading />
      </Page>
    )
  }
  if (status === 'refused' && refusal) {
    return (
      <Page title={words.product}>
        <RefusedPage refusal={refusal} onRetry={() => void reload()} />
      </Page>
    )
  }
  // A guest belongs to one lesson; everything else asks for an account.
  if (!me || me.isGuest) return <Redirect href={`/sign-in?to=${encodeURIComponent(path)}` as never} />
  return <>{children(me, isDemo)}</>
}

import { Notice, Refused } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Refusal } from './call'

/** A refusal above or below a form. Nothing when the fields say all there is to say. */
export function RefusalNotice({ refusal }: Readonly<{ refusal: Refusal | null }>) {
  const words = useWords().errors
  if (!refusal || (refusal.code === 'invalid' && refusal.fields.length > 0)) return null
  const { title, more } = words.of(refusal.code)
  return (
    <Notice kind="bad" title={title}>
      {refusal.retryAfterSeconds ? words.wait(refusal.retryAfterSeconds) : more}
    </Notice>
  )
}

/** A refusal in the place of what was asked for. */
export function RefusedPage({ refusal, onRetry }: Readonly<{ refusal: Refusal; onRetry?: () => void }>) {
  const words = useWords()
  const { title, more } = words.errors.of(refusal.code)
  const isSignedOut = refusal.code === 'signed-out'
  const here = typeof window === 'undefined' ? '' : window.location.pathname + window.location.search
  const mayHelp = ['offline', 'unavailable', 'internal', 'bad-reply', 'too-many-tries'].includes(refusal.code)
  return (
    <Refused
      title={title}
      onRetry={mayHelp ? onRetry : undefined}
      href={isSignedOut ? `/sign-in?to=${encodeURIComponent(here)}` : mayHelp ? undefined : '/home'}
      linkLabel={isSignedOut ? words.common.signIn : undefined}
    >
      {more}
    </Refused>
  )
}

import type { ReactNode } from 'react'
import { View } from 'react-native'
import { RefusedPage } from '@/components/api'
import type { ClosedReason } from '@/components/room'
import { space } from '@/components/theme'
import { Loading, Refused, useTitle } from '@/components/ui'
import { useWords } from '@/components/words'
import type { EntryState } from './use-entry'

/** What stands in the place of a face that cannot be shown: coming up, refused, closed. */
function DoorPage({ title, children }: Readonly<{ title: string; children: ReactNode }>) {
  useTitle(title)
  return (
    <View
      role="main"
      id="page"
      style={{ padding: space.one, paddingTop: space.wide, maxWidth: 620, width: '100%' }}
    >
      {children}
    </View>
  )
}

export function EntryDoor({ state, onRetry }: Readonly<{ state: EntryState; onRetry: () => void }>) {
  const words = useWords()
  return (
    <DoorPage title={words.lesson.loading}>
      {state.status === 'refused' ? (
        <RefusedPage refusal={state.refusal} onRetry={onRetry} />
      ) : (
        <Loading lines={5} />
      )}
    </DoorPage>
  )
}

/** The board has not arrived yet. */
export function BoardDoor({ title, isUnloadable }: Readonly<{ title: string; isUnloadable: boolean }>) {
  const words = useWords()
  return (
    <DoorPage title={title}>
      {isUnloadable ? (
        <Refused title={words.errors.of('offline').title} onRetry={() => window.location.reload()}>
          {words.errors.of('offline').more}
        </Refused>
      ) : (
        <Loading lines={5} />
      )}
    </DoorPage>
  )
}

/** The room will not come back by itself: why, and where to go. */
export function ClosedDoor({
  title,
  because,
  href,
  linkLabel,
}: Readonly<{ title: string; because: ClosedReason | null; href?: string; linkLabel?: string }>) {
  const words = useWords()
  const reasons = words.lesson.closedBecause
  const mayReload = because !== 'lesson-ended' && because !== 'removed' && because !== 'forbidden'
  return (
    <DoorPage title={title}>
      <Refused
        level={1}
        title={because && because in reasons ? reasons[because as keyof typeof reasons] : reasons.other}
        href={href}
        linkLabel={linkLabel}
        onRetry={mayReload ? () => window.location.reload() : undefined}
      />
    </DoorPage>
  )
}

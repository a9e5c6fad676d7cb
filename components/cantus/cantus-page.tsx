import { RefusedPage, useQuery } from '@/components/api'
import { Frame } from '@/components/session'
import { Loading } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Me } from '@/shared/api/people'
import { CantusEditor } from './cantus-editor'
import { CantusView } from './cantus-view'
import { draftOf, EMPTY_DRAFT } from './draft'

/** One cantus: to look at, or to change when it is one's own and that is asked. */
export function CantusPage({
  me,
  cantusId,
  isChanging,
}: Readonly<{ me: Me; cantusId: string; isChanging: boolean }>) {
  const words = useWords()
  const query = useQuery(api.cantus.get, { params: { cantusId } })
  if (query.data) {
    const { cantus } = query.data
    return isChanging && cantus.isMine ? (
      <CantusEditor me={me} cantusId={cantusId} draftId={cantusId} start={draftOf(cantus)} />
    ) : (
      <CantusView me={me} cantus={cantus} />
    )
  }
  return (
    <Frame me={me} title={words.cantus.title} up={{ href: '/cantus', label: words.cantus.edit.up }}>
      {query.refusal ? <RefusedPage refusal={query.refusal} onRetry={query.reload} /> : <Loading />}
    </Frame>
  )
}

/** A new cantus, empty or from another one: the notes are taken over, the source is not. */
export function NewCantusPage({ me, fromId }: Readonly<{ me: Me; fromId: string | null }>) {
  const words = useWords()
  const query = useQuery(
    api.cantus.get,
    { params: { cantusId: fromId ?? 'none' } },
    { isOff: fromId === null },
  )
  if (fromId !== null && query.status === 'loading') {
    return (
      <Frame me={me} title={words.cantus.edit.newTitle} up={{ href: '/cantus', label: words.cantus.edit.up }}>
        <Loading />
      </Frame>
    )
  }
  const from = query.data ? draftOf(query.data.cantus) : null
  const start = from ? { ...from, title: '', source: '', courseId: '' } : EMPTY_DRAFT
  return (
    <CantusEditor
      key={fromId}
      me={me}
      cantusId={null}
      draftId={fromId ? `from-${fromId}` : 'new'}
      start={start}
    />
  )
}

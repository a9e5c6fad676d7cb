import type { ReactNode } from 'react'
import { Loading, Notice } from '@/components/ui'
import { useWords } from '@/components/words'
import { RefusedPage } from './refusal-notice'
import type { Query } from './use-query'

/** Draws an answer, or in its place what there is to say while there is none; keeps an old answer in sight when offline. */
export function Asked<Data>({
  query,
  children,
  lines,
}: Readonly<{ query: Query<Data>; children: (data: Data) => ReactNode; lines?: number }>) {
  const words = useWords().common
  if (query.data === null) {
    return query.refusal ? (
      <RefusedPage refusal={query.refusal} onRetry={query.reload} />
    ) : (
      <Loading lines={lines} />
    )
  }
  return (
    <>
      {query.refusal ? <Notice kind="note" title={words.offline} /> : null}
      {children(query.data)}
    </>
  )
}

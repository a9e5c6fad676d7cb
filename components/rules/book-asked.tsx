import type { ReactNode } from 'react'
import { Loading, Refused } from '@/components/ui'
import { useWords } from '@/components/words'
import type { RuleBook } from '@/shared/rules/rule-book'
import { useRuleBook } from './use-rule-book'

/** Draws what needs the rule book; its place is kept while it comes, and it can be asked for again. */
export function BookAsked({
  children,
  lines,
}: Readonly<{ children: (book: RuleBook) => ReactNode; lines?: number }>) {
  const words = useWords().rules
  const { book, hasFailed, retry } = useRuleBook()
  if (book) return <>{children(book)}</>
  return hasFailed ? (
    <Refused title={words.failed} onRetry={retry}>
      {words.failedMore}
    </Refused>
  ) : (
    <Loading lines={lines} />
  )
}

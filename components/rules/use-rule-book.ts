import { useCallback, useEffect, useState } from 'react'
import type { RuleBook } from '@/shared/rules/rule-book'

let loading: Promise<RuleBook> | null = null

/** Asks for the book once; again when it did not come. */
function loadRuleBook(): Promise<RuleBook> {
  loading ??= import('@/shared/rules/rule-book').then(
    ({ RULE_BOOK }) => RULE_BOOK,
    (error: unknown) => {
      loading = null
      throw error
    },
  )
  return loading
}

export type RuleBookState = Readonly<{
  /** Null until it has come. */
  book: RuleBook | null
  /** It did not come: there is no network. */
  hasFailed: boolean
  retry: () => void
}>

/**
 * What every rule says of itself: statement, reasons, sources, examples. It is loaded by who asks; in a browser a rule's
 * own `explain` holds only `title`, `mends` and `messages`.
 */
export function useRuleBook(): RuleBookState {
  const [book, setBook] = useState<RuleBook | null>(null)
  const [hasFailed, setFailed] = useState(false)
  const [turn, setTurn] = useState(0)
  useEffect(() => {
    let isHere = true
    loadRuleBook().then(
      (loaded) => {
        if (isHere) setBook(loaded)
      },
      () => {
        if (isHere) setFailed(true)
      },
    )
    return () => {
      isHere = false
    }
  }, [turn])
  const retry = useCallback(() => {
    setFailed(false)
    setTurn((before) => before + 1)
  }, [])
  return { book, hasFailed, retry }
}

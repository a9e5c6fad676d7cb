import { useCallback, useEffect, useMemo, useState } from 'react'
import type { Query, Refusal } from '@/components/api'
import { fetchRuleSet, type FoundRuleSet } from './fetch-rule-set'

/** The rule set of an id, as a query, so that it is drawn like every other. */
export function useRuleSet(id: string): Query<FoundRuleSet> {
  const [state, setState] = useState<Readonly<{ data: FoundRuleSet | null; refusal: Refusal | null }>>({
    data: null,
    refusal: null,
  })
  const [turn, setTurn] = useState(0)
  useEffect(() => {
    let isHere = true
    void fetchRuleSet(id).then((result) => {
      if (!isHere) return
      setState(result.ok ? { data: result.value, refusal: null } : { data: null, refusal: result.reason })
    })
    return () => {
      isHere = false
    }
  }, [id, turn])
  const reload = useCallback(() => setTurn((before) => before + 1), [])
  const setData = useCallback((data: FoundRuleSet) => setState({ data, refusal: null }), [])
  return useMemo(
    () => ({
      status: state.data ? 'ready' : state.refusal ? 'refused' : 'loading',
      ...state,
      isReloading: false,
      reload,
      setData,
    }),
    [state, reload, setData],
  )
}

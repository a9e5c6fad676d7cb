import { useCallback, useMemo, useRef, useState } from 'react'
import { useWords } from '@/components/words'
import type { Result } from '@/shared/result'
import { callApi, type AnyEndpoint, type InputOf, type Refusal, type ReplyOf } from './call'

export type Mutation<Input, Reply> = Readonly<{
  /** Sends it. A second press while the first is under way waits for the first and sends nothing. */
  run: (input: Input) => Promise<Result<Reply, Refusal>>
  isBusy: boolean
  refusal: Refusal | null
  /** What the server said of one field, in words, or null. `problemOf('name')` */
  problemOf: (path: string) => string | null
  reset: () => void
}>

/** Any act that may be refused, with its state; `useMutation` is this for an endpoint. */
export function useAct<Input, Reply>(
  act: (input: Input) => Promise<Result<Reply, Refusal>>,
): Mutation<Input, Reply> {
  const words = useWords().errors
  const [isBusy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const underWay = useRef<Promise<Result<Reply, Refusal>> | null>(null)
  const held = useRef(act)
  held.current = act

  const run = useCallback((input: Input) => {
    underWay.current ??= (async () => {
      setBusy(true)
      try {
        const result = await held.current(input)
        setRefusal(result.ok ? null : result.reason)
        return result
      } finally {
        underWay.current = null
        setBusy(false)
      }
    })()
    return underWay.current
  }, [])
  const reset = useCallback(() => setRefusal(null), [])
  return useMemo(() => {
    const problemOf = (path: string) => {
      const field = refusal?.fields.find((one) => one.path === path)
      return field ? words.field(field.code, field.args) : null
    }
    return { run, isBusy, refusal, problemOf, reset }
  }, [run, isBusy, refusal, reset, words])
}

export function useMutation<E extends AnyEndpoint>(endpoint: E): Mutation<InputOf<E>, ReplyOf<E>> {
  return useAct((input: InputOf<E>) => callApi(endpoint, input))
}

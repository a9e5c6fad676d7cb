import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { callApi, type AnyEndpoint, type InputOf, type Refusal, type ReplyOf } from './call'

export type Query<Data> = Readonly<{
  status: 'loading' | 'ready' | 'refused'
  /** The last answer, kept in sight while a new one is fetched or after one was refused. */
  data: Data | null
  refusal: Refusal | null
  isReloading: boolean
  reload: () => void
  /** Puts an answer that came another way (of a change) in its place. */
  setData: (data: Data) => void
}>

type State<Data> = Readonly<{ data: Data | null; refusal: Refusal | null; isBusy: boolean }>

/** Asks when it appears and whenever what it asks changes; asks again when the page comes back online. */
export function useQuery<E extends AnyEndpoint>(
  endpoint: E,
  input: InputOf<E>,
  options: Readonly<{ isOff?: boolean }> = {},
): Query<ReplyOf<E>> {
  const { isOff = false } = options
  const key = JSON.stringify([endpoint.method, endpoint.path, input])
  const [state, setState] = useState<State<ReplyOf<E>>>({ data: null, refusal: null, isBusy: !isOff })
  const [turn, setTurn] = useState(0)
  const held = useRef(input)
  held.current = input

  useEffect(() => {
    if (isOff) return
    const abort = new AbortController()
    setState((before) => ({ ...before, isBusy: true }))
    callApi(endpoint, held.current, { signal: abort.signal }).then(
      (result) =>
        setState((before) =>
          result.ok
            ? { data: result.value, refusal: null, isBusy: false }
            : { data: before.data, refusal: result.reason, isBusy: false },
        ),
      () => undefined,
    )
    return () => abort.abort()
  }, [endpoint, key, turn, isOff])

  const reload = useCallback(() => setTurn((before) => before + 1), [])
  const isCutOff = state.refusal?.code === 'offline'
  useEffect(() => {
    if (!isCutOff) return
    window.addEventListener('online', reload)
    return () => window.removeEventListener('online', reload)
  }, [isCutOff, reload])
  const setData = useCallback((data: ReplyOf<E>) => setState({ data, refusal: null, isBusy: false }), [])
  return useMemo(
    () => ({
      status: state.data !== null ? 'ready' : state.refusal ? 'refused' : 'loading',
      data: state.data,
      refusal: state.refusal,
      isReloading: state.isBusy && state.data !== null,
      reload,
      setData,
    }),
    [state, reload, setData],
  )
}

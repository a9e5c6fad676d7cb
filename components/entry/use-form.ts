import { useCallback, useMemo, useState } from 'react'
import type { FieldProblem } from '@/shared/api/errors'
import { useWords } from '@/components/words'

type Values = Readonly<Record<string, string>>

export type FormState<V extends Values> = Readonly<{
  values: V
  /** Props of a `Field` for one value. */
  bind: <K extends keyof V & string>(
    key: K,
  ) => Readonly<{ name: K; value: V[K]; onChangeText: (text: string) => void; problem: string | null }>
  set: (values: Partial<V>) => void
  /** Puts problems beside their fields; true when there were none. */
  report: (problems: readonly FieldProblem[]) => boolean
}>

/** What was typed, and what is wrong with it. A problem goes when its field is changed; what was typed never does. */
export function useForm<V extends Values>(start: V): FormState<V> {
  const words = useWords().errors
  const [values, setValues] = useState(start)
  const [problems, setProblems] = useState<readonly FieldProblem[]>([])
  const set = useCallback((some: Partial<V>) => setValues((before) => ({ ...before, ...some })), [])
  const report = useCallback((found: readonly FieldProblem[]) => {
    setProblems(found)
    return found.length === 0
  }, [])
  return useMemo(
    () => ({
      values,
      set,
      report,
      bind: (key) => {
        const problem = problems.find((one) => one.path === key)
        return {
          name: key,
          value: values[key],
          problem: problem ? words.field(problem.code, problem.args) : null,
          onChangeText: (text) => {
            setValues((before) => ({ ...before, [key]: text }))
            setProblems((before) => before.filter((one) => one.path !== key))
          },
        }
      },
    }),
    [values, problems, set, report, words],
  )
}

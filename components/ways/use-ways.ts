import { useEffect, useReducer, useRef } from 'react'
import type { LessonView } from '@/components/lesson/lesson-view'
import { identityOfLine } from '@/components/lesson/line-with'
import type { BoardExercise } from '@/shared/wire/documents'
import type { WaysAnswer, WaysQuestion, WaysReply, WaysRequest } from './ways-messages'

/** The answer to a question of the present score; null while it is being counted. */
export type KnownWays = (key: string) => WaysAnswer | null

/** Answers kept: a lesson asks of thousands of lines, of which the last few hundred come again. */
const MOST_KEPT = 600

const NOTHING_KNOWN: KnownWays = () => null

/** A browser without workers, or one that cannot load this one, shows no counts; nothing else depends on them. */
function startWorker(): Worker | null {
  try {
    return new Worker(new URL('./ways-worker', window.location.href))
  } catch {
    return null
  }
}

/** What an answer depends on, beside the exercise. */
const identityOf = ({ setAside }: LessonView, { line, aliveInBar }: WaysQuestion): string =>
  `${[...setAside].join()};${aliveInBar ?? ''};${identityOfLine(line)}`

/**
 * Counts ways to finish in a worker, each line once: what is known is shown at once, and a score that moves on puts
 * aside what is still being counted for the old one. `null` asks nothing and loads nothing.
 */
export function useWays(view: LessonView, questions: readonly WaysQuestion[] | null): KnownWays {
  const worker = useRef<Worker | null>(null)
  const number = useRef(0)
  const known = useRef(new Map<string, WaysAnswer>())
  const knownOf = useRef<BoardExercise>(view.written)
  const [, redraw] = useReducer((count: number) => count + 1, 0)
  if (knownOf.current !== view.written) {
    knownOf.current = view.written
    known.current = new Map()
  }

  const identities = new Map((questions ?? []).map((question) => [question.key, identityOf(view, question)]))
  const asked = [...identities.values()].join('\n')

  useEffect(() => {
    const unknown = (questions ?? []).filter(({ key }) => !known.current.has(identities.get(key) as string))
    if (unknown.length === 0) return
    worker.current ??= startWorker()
    const at = worker.current
    if (!at) return
    number.current += 1
    const request: WaysRequest = {
      number: number.current,
      exercise: view.written,
      ruleSet: view.written.ruleSet,
      setAside: [...view.setAside],
      questions: unknown.map((question) => ({ ...question, key: identities.get(question.key) as string })),
    }
    const answers = known.current
    const hear = ({ data }: MessageEvent<WaysReply>) => {
      if (data.number !== request.number) return
      if (answers.size >= MOST_KEPT) answers.delete(answers.keys().next().value as string)
      answers.set(data.key, data.answer)
      redraw()
    }
    at.addEventListener('message', hear)
    at.postMessage(request)
    return () => at.removeEventListener('message', hear)
    // eslint-disable-next-line react-hooks/exhaustive-deps -- `asked` stands for the questions
  }, [asked, view.written])

  useEffect(
    () => () => {
      worker.current?.terminate()
      worker.current = null
    },
    [],
  )

  if (questions === null) return NOTHING_KNOWN
  return (key) => known.current.get(identities.get(key) ?? '') ?? null
}

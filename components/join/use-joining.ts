import { useRouter, type Href } from 'expo-router'
import { useCallback, useState } from 'react'
import { callApi, type Refusal } from '@/components/api'
import { loadSession } from '@/components/session'
import { useWords, type Words } from '@/components/words'
import { api } from '@/shared/api'
import { MAX_NAME_CHARACTERS, nameSchema } from '@/shared/api/fields'

/** Where somebody is on the way into a lesson. */
export type Joining = Readonly<
  | { step: 'code'; problem: string | null }
  | { step: 'looking' }
  | { step: 'name'; code: string; title: string; problem: string | null; isBusy: boolean }
  | { step: 'entering' }
>

const AT_CODE: Joining = { step: 'code', problem: null }

/** Why a code or a name was not taken, in the words of this screen. */
function problemOf({ code, retryAfterSeconds }: Refusal, words: Words): string {
  const { problems } = words.join
  switch (code) {
    case 'code-unknown':
    case 'not-found':
    case 'ended':
    case 'bad-request':
      return problems.unknown
    case 'door-closed':
      return problems.doorClosed
    case 'lesson-full':
      return problems.full
    case 'too-many-tries':
      return problems.tooManyTries(retryAfterSeconds)
    case 'name-refused':
    case 'invalid':
      return problems.nameRefused
    case 'offline':
      return problems.offline
    default:
      return problems.other
  }
}

/** What is wrong with a name before it is sent; null when it may be. */
export function nameProblem(name: string, words: Words): string | null {
  const parsed = nameSchema.safeParse(name)
  if (parsed.success) return null
  const { problems } = words.join
  const code = parsed.error.issues[0]?.message
  if (code === 'empty') return problems.nameEmpty
  return code === 'too-long' ? problems.nameTooLong(MAX_NAME_CHARACTERS) : problems.nameHidden
}

/** The way in: finds the lesson of a code, asks for a name where one is needed, and goes to the desk. */
export function useJoining() {
  const words = useWords()
  const router = useRouter()
  const [joining, setJoining] = useState<Joining>(AT_CODE)

  const enter = useCallback(
    async (code: string, name?: string): Promise<Refusal | null> => {
      const joined = await callApi(api.lessons.join, { body: name === undefined ? { code } : { code, name } })
      if (!joined.ok) return joined.reason
      setJoining({ step: 'entering' })
      // A guest's session began with that answer: whoever asks next must see it.
      await loadSession()
      router.replace(`/lessons/${joined.value.lessonId}/desk` as Href)
      return null
    },
    [router],
  )

  const findLesson = useCallback(
    async (code: string) => {
      setJoining({ step: 'looking' })
      const found = await callApi(api.lessons.peek, { params: { code } })
      if (!found.ok) return setJoining({ step: 'code', problem: problemOf(found.reason, words) })
      if (found.value.needsName)
        return setJoining({ step: 'name', code, title: found.value.title, problem: null, isBusy: false })
      const refusal = await enter(code)
      if (refusal) setJoining({ step: 'code', problem: problemOf(refusal, words) })
    },
    [enter, words],
  )

  const giveName = useCallback(
    async (code: string, title: string, name: string) => {
      const problem = nameProblem(name, words)
      if (problem) return setJoining({ step: 'name', code, title, problem, isBusy: false })
      setJoining({ step: 'name', code, title, problem: null, isBusy: true })
      const refusal = await enter(code, name.trim())
      if (!refusal) return
      const isOfCode = ['code-unknown', 'not-found', 'ended', 'door-closed', 'lesson-full'].includes(
        refusal.code,
      )
      setJoining(
        isOfCode
          ? { step: 'code', problem: problemOf(refusal, words) }
          : { step: 'name', code, title, problem: problemOf(refusal, words), isBusy: false },
      )
    },
    [enter, words],
  )

  const startOver = useCallback(() => setJoining(AT_CODE), [])
  return { joining, findLesson, giveName, startOver }
}

import { useLocalSearchParams } from 'expo-router'
import { useEffect, useRef, useState } from 'react'
import { auth, Frame, loadSession, takeReturnPath } from '@/components/session'
import { LinkButton, Loading, Notice, Refused } from '@/components/ui'
import { useWords } from '@/components/words'

/**
 * Where the link in the message ends. With a `token` the page confirms the address itself; without one the server has
 * done so on the way here, or has put the reason why not in `error`.
 */
export default function Verify() {
  const words = useWords().entry
  const { token, error } = useLocalSearchParams<{ token?: string; error?: string }>()
  const [state, setState] = useState<'busy' | 'done' | 'bad'>(error ? 'bad' : token ? 'busy' : 'done')
  const isAsked = useRef(false)
  const [to, setTo] = useState('/home')

  useEffect(() => {
    // A link works once: asking twice would say that it was used already.
    if (isAsked.current) return
    isAsked.current = true
    setTo(takeReturnPath())
    if (token && !error) {
      void auth.verify(token).then(async (result) => {
        await loadSession()
        setState(result.ok ? 'done' : 'bad')
      })
    } else void loadSession()
  }, [token, error])

  return (
    <Frame me={null} title={words.verify.title} width="text">
      {state === 'busy' ? <Loading lines={2} /> : null}
      {state === 'done' ? (
        <>
          <Notice kind="good" title={words.verify.doneTitle}>
            {words.verify.done}
          </Notice>
          <LinkButton kind="go" href={to} label={words.verify.on} />
        </>
      ) : null}
      {state === 'bad' ? (
        <>
          <Refused title={words.verify.badTitle}>{words.verify.bad}</Refused>
          <LinkButton href="/sign-in" label={words.signIn.go} />
        </>
      ) : null}
    </Frame>
  )
}

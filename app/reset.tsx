import { useLocalSearchParams } from 'expo-router'
import { useState } from 'react'
import { firstProblems, RefusalNotice, useAct } from '@/components/api'
import { resetSchema } from '@/components/entry/schemas'
import { useForm } from '@/components/entry/use-form'
import { auth, Frame } from '@/components/session'
import { Button, Field, Form, LinkButton, LinkText, Notice, Refused } from '@/components/ui'
import { useWords } from '@/components/words'

export default function Reset() {
  const words = useWords().entry
  const { token, error } = useLocalSearchParams<{ token?: string; error?: string }>()
  const form = useForm({ password: '' })
  const reset = useAct((password: string) => auth.reset(token ?? '', password))
  const [isDone, setDone] = useState(false)
  const isSpent = !token || Boolean(error) || reset.refusal?.code === 'ended'

  const submit = async () => {
    if (!form.report(firstProblems(resetSchema, form.values))) return
    const result = await reset.run(form.values.password)
    if (result.ok) setDone(true)
    else form.report(result.reason.fields)
  }

  return (
    <Frame me={null} title={words.reset.title} width="text">
      {isDone ? (
        <Notice
          kind="good"
          title={words.reset.doneTitle}
          action={<LinkText href="/sign-in" label={words.signIn.go} />}
        >
          {words.reset.done}
        </Notice>
      ) : isSpent ? (
        <>
          <Refused title={words.reset.badTitle}>{words.reset.bad}</Refused>
          <LinkButton href="/forgot" label={words.reset.another} />
        </>
      ) : (
        <>
          <RefusalNotice refusal={reset.refusal} />
          <Form label={words.reset.title} onSubmit={() => void submit()}>
            <Field
              {...form.bind('password')}
              label={words.fields.newPassword}
              hint={words.fields.passwordHint}
              kind="password"
              autoComplete="new-password"
              maxLength={128}
            />
            <Button kind="go" label={words.reset.go} isSubmit isBusy={reset.isBusy} />
          </Form>
        </>
      )}
    </Frame>
  )
}

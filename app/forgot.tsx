import { useState } from 'react'
import { firstProblems, RefusalNotice, useAct } from '@/components/api'
import { forgotSchema } from '@/components/entry/schemas'
import { useForm } from '@/components/entry/use-form'
import { auth, Frame, useSession } from '@/components/session'
import { Button, Field, Form, LinkText, Notice } from '@/components/ui'
import { useWords } from '@/components/words'

export default function Forgot() {
  const words = useWords().entry
  const { isDemo } = useSession()
  const form = useForm({ email: '' })
  const ask = useAct(auth.askReset)
  const [sentTo, setSentTo] = useState<string | null>(null)

  const submit = async () => {
    if (!form.report(firstProblems(forgotSchema, form.values))) return
    const email = form.values.email.trim()
    const result = await ask.run(email)
    if (result.ok) setSentTo(email)
    else form.report(result.reason.fields)
  }

  return (
    <Frame me={null} title={words.forgot.title} lede={words.forgot.lede} width="text">
      {sentTo ? (
        <Notice
          kind="good"
          title={words.forgot.sentTitle}
          action={isDemo ? <LinkText href="/demo/mail" label={words.signUp.demoMail} /> : null}
        >
          {words.forgot.sent(sentTo)}
        </Notice>
      ) : null}
      <RefusalNotice refusal={ask.refusal} />
      <Form label={words.forgot.title} onSubmit={() => void submit()}>
        <Field {...form.bind('email')} label={words.fields.email} kind="email" autoComplete="username" />
        <Button kind="go" label={words.forgot.go} isSubmit isBusy={ask.isBusy} />
      </Form>
    </Frame>
  )
}

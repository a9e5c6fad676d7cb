import { useState } from 'react'
import { firstProblems, RefusalNotice, useAct } from '@/components/api'
import { auth, keepReturnPath } from '@/components/session'
import { Button, Field, Form, LinkText, Notice, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { signUpSchema } from './schemas'
import { useForm } from './use-form'

/** Name, address, password; the account opens with the link that is sent. */
export function SignUpForm({ to, isDemo }: Readonly<{ to: string; isDemo: boolean }>) {
  const words = useWords().entry
  const form = useForm({ name: '', email: '', password: '' })
  const signUp = useAct(auth.signUp)
  const [sentTo, setSentTo] = useState<string | null>(null)

  const submit = async () => {
    if (!form.report(firstProblems(signUpSchema, form.values))) return
    const { name, email, password } = form.values
    const result = await signUp.run({
      name: name.trim(),
      email: email.trim(),
      password,
      callbackURL: '/verify',
    })
    if (!result.ok) return void form.report(result.reason.fields)
    keepReturnPath(to)
    setSentTo(email.trim())
  }

  if (sentTo) {
    return (
      <Notice
        kind="good"
        title={words.signUp.sentTitle}
        action={isDemo ? <LinkText href="/demo/mail" label={words.signUp.demoMail} /> : null}
      >
        {words.signUp.sent(sentTo)}
      </Notice>
    )
  }
  return (
    <>
      <RefusalNotice refusal={signUp.refusal} />
      <Form label={words.signUp.title} onSubmit={() => void submit()}>
        <Field
          {...form.bind('name')}
          label={words.fields.name}
          hint={words.fields.nameHint}
          autoComplete="name"
        />
        <Field
          {...form.bind('email')}
          label={words.fields.email}
          kind="email"
          autoComplete="username"
          maxLength={254}
        />
        <Field
          {...form.bind('password')}
          label={words.fields.password}
          hint={words.fields.passwordHint}
          kind="password"
          autoComplete="new-password"
          maxLength={128}
        />
        <Txt kind="note" tone="lead">
          {words.signUp.kept} {words.signUp.young}
        </Txt>
        <Button kind="go" label={words.signUp.go} isSubmit isBusy={signUp.isBusy} />
      </Form>
      <Txt tone="lead">
        {`${words.signUp.haveOne} `}
        <LinkText href={`/sign-in?to=${encodeURIComponent(to)}`} label={words.signIn.go} />
      </Txt>
    </>
  )
}

import { useState } from 'react'
import { firstProblems, RefusalNotice, useAct } from '@/components/api'
import { changePasswordSchema } from '@/components/entry/schemas'
import { useForm } from '@/components/entry/use-form'
import { auth } from '@/components/session'
import { Button, Field, Form, Notice } from '@/components/ui'
import { useWords } from '@/components/words'
import { Section } from './section'

/** A new password, against the old one. Ends every other session. */
export function Password({ onChanged }: Readonly<{ onChanged: () => void }>) {
  const words = useWords()
  const form = useForm({ currentPassword: '', password: '' })
  const change = useAct(auth.changePassword)
  const [isDone, setDone] = useState(false)

  const submit = async () => {
    setDone(false)
    if (!form.report(firstProblems(changePasswordSchema, form.values))) return
    const { currentPassword, password } = form.values
    const result = await change.run({ currentPassword, newPassword: password })
    if (!result.ok) return void form.report(result.reason.fields)
    form.set({ currentPassword: '', password: '' })
    setDone(true)
    onChanged()
  }

  return (
    <Section title={words.account.password}>
      {isDone ? <Notice kind="good" title={words.account.passwordDone} /> : null}
      <RefusalNotice refusal={change.refusal} />
      <Form label={words.account.password} onSubmit={() => void submit()}>
        <Field
          {...form.bind('currentPassword')}
          label={words.entry.fields.currentPassword}
          kind="password"
          autoComplete="current-password"
          maxLength={128}
        />
        <Field
          {...form.bind('password')}
          label={words.entry.fields.newPassword}
          hint={words.entry.fields.passwordHint}
          kind="password"
          autoComplete="new-password"
          maxLength={128}
        />
        <Button label={words.account.passwordGo} isSubmit isBusy={change.isBusy} />
      </Form>
    </Section>
  )
}

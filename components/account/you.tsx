import { useState } from 'react'
import { firstProblems, RefusalNotice, useAct } from '@/components/api'
import { renameSchema } from '@/components/entry/schemas'
import { useForm } from '@/components/entry/use-form'
import { auth, loadSession } from '@/components/session'
import { Button, Field, Form, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'
import { Section } from './section'

/** Name and address. */
export function You({ me }: Readonly<{ me: Me }>) {
  const words = useWords()
  const form = useForm({ name: me.name })
  const rename = useAct(auth.rename)
  const [isDone, setDone] = useState(false)

  const submit = async () => {
    setDone(false)
    if (!form.report(firstProblems(renameSchema, form.values))) return
    const result = await rename.run(form.values.name.trim())
    if (!result.ok) return void form.report(result.reason.fields)
    setDone(true)
    await loadSession()
  }

  return (
    <Section title={words.account.you}>
      <Txt>
        {me.email}{' '}
        <Txt tone="lead">{`(${me.isVerified ? words.account.addressConfirmed : words.account.addressOpen})`}</Txt>
      </Txt>
      <RefusalNotice refusal={rename.refusal} />
      <Form label={words.account.you} onSubmit={() => void submit()}>
        <Field
          {...form.bind('name')}
          label={words.entry.fields.name}
          hint={isDone ? words.account.nameDone : words.entry.fields.nameHint}
          autoComplete="name"
        />
        <Button label={words.account.nameGo} isSubmit isBusy={rename.isBusy} />
      </Form>
    </Section>
  )
}

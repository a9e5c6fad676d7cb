import { useState } from 'react'
import { z } from 'zod'
import { firstProblems, RefusalNotice, type Refusal } from '@/components/api'
import { Button, Dialog, DialogActions, Field, Form } from '@/components/ui'
import { useWords } from '@/components/words'
import type { FieldProblem } from '@/shared/api/errors'
import { titleSchema } from '@/shared/api/fields'

const schema = z.object({ name: titleSchema })

/** Asks for the name of a course: a new one, or another for one there is. What was typed stays when it is refused. */
export function NameDialog({
  title,
  goLabel,
  start,
  isOpen,
  isBusy,
  refusal,
  onClose,
  onName,
}: Readonly<{
  title: string
  goLabel: string
  start: string
  isOpen: boolean
  isBusy: boolean
  refusal: Refusal | null
  onClose: () => void
  onName: (name: string) => void
}>) {
  const words = useWords()
  const [name, setName] = useState(start)
  const [found, setFound] = useState<FieldProblem | null>(null)
  const problem = found ?? refusal?.fields.find((one) => one.path === 'name') ?? null
  const submit = () => {
    const [first] = firstProblems(schema, { name })
    setFound(first ?? null)
    if (!first) onName(name.trim())
  }
  return (
    <Dialog title={title} isOpen={isOpen} onClose={onClose}>
      <RefusalNotice refusal={refusal} />
      <Form label={title} onSubmit={submit}>
        <Field
          label={words.courses.home.nameLabel}
          hint={words.courses.home.nameHint}
          value={name}
          hasFocus
          problem={problem ? words.errors.field(problem.code, problem.args) : null}
          onChangeText={(text) => {
            setName(text)
            setFound(null)
          }}
        />
        <DialogActions>
          <Button label={words.common.cancel} onPress={onClose} />
          <Button kind="go" label={goLabel} isSubmit isBusy={isBusy} />
        </DialogActions>
      </Form>
    </Dialog>
  )
}

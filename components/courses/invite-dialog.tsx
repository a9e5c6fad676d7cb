import { useState } from 'react'
import { View } from 'react-native'
import { firstProblems, RefusalNotice, useMutation, useQuery } from '@/components/api'
import { space } from '@/components/theme'
import { Button, Choice, CopyField, Dialog, DialogActions, Field, Form, Heading, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { courseRoleSchema, type CourseRole } from '@/shared/api/fields'
import { InviteResults } from './invite-results'
import { OpenInvitations } from './open-invitations'

/** Inviting to a course: many by message, or anyone by a link; and what is still open. */
export function InviteDialog({ courseId, onClose }: Readonly<{ courseId: string; onClose: () => void }>) {
  const words = useWords()
  const invite = useMutation(api.courses.inviteMany)
  const link = useMutation(api.courses.createLink)
  const open = useQuery(api.courses.invitations, { params: { courseId } })
  const [pasted, setPasted] = useState('')
  const [role, setRole] = useState<CourseRole>('student')
  const [problem, setProblem] = useState<string | null>(null)
  const [results, setResults] = useState<Parameters<typeof InviteResults>[0]['results'] | null>(null)
  const [url, setUrl] = useState<string | null>(null)

  const send = async () => {
    const [first] = firstProblems(api.courses.inviteMany.body!, { pasted, role })
    setProblem(first ? words.errors.field(first.code, first.args) : null)
    if (first) return
    const result = await invite.run({ params: { courseId }, body: { pasted, role } })
    if (!result.ok) return
    setResults(result.value)
    // What could not be sent stays in the field, to be mended.
    setPasted(result.value.refused.map(({ text }) => text).join('\n'))
    open.reload()
  }
  const makeLink = async () => {
    const result = await link.run({ params: { courseId }, body: { role } })
    if (!result.ok) return
    setUrl(result.value.invitation.url)
    open.reload()
  }

  return (
    <Dialog title={words.courses.invite.title} isOpen onClose={onClose} widthPx={680}>
      <Choice
        label={words.courses.invite.as}
        value={role}
        onChange={setRole}
        options={courseRoleSchema.options.map((value) => ({ value, label: words.courses.roles[value] }))}
      />
      <RefusalNotice refusal={invite.refusal ?? link.refusal} />
      <Form label={words.courses.invite.byMail} onSubmit={() => void send()} gapPx={space.half}>
        <Field
          label={words.courses.invite.pasted}
          hint={words.courses.invite.pastedHint}
          problem={problem ?? invite.problemOf('pasted')}
          value={pasted}
          rows={4}
          isVerbatim
          onChangeText={(text) => {
            setPasted(text)
            setProblem(null)
          }}
        />
        <Button kind="go" label={words.courses.invite.go} isSubmit isBusy={invite.isBusy} />
      </Form>
      {results ? <InviteResults results={results} /> : null}
      <View style={{ gap: space.small }}>
        <Heading level={3}>{words.courses.invite.byLink}</Heading>
        <Txt tone="lead">{words.courses.invite.linkLead}</Txt>
        {url ? (
          <CopyField
            label={words.courses.invite.linkLabel}
            value={url}
            hint={words.courses.invite.linkOnce}
          />
        ) : (
          <Button label={words.courses.invite.linkGo} isBusy={link.isBusy} onPress={() => void makeLink()} />
        )}
      </View>
      <OpenInvitations courseId={courseId} query={open} />
      <DialogActions>
        <Button label={words.common.close} onPress={onClose} />
      </DialogActions>
    </Dialog>
  )
}

import { useRouter } from 'expo-router'
import { View } from 'react-native'
import { firstProblems, RefusalNotice, useAct } from '@/components/api'
import { auth, keepReturnPath, loadSession } from '@/components/session'
import { space, useWidth } from '@/components/theme'
import { Button, Field, Form, LinkText, Notice, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { DemoPeople } from './demo-people'
import { signInSchema } from './schemas'
import { useForm } from './use-form'

/** Address and password, then on to where the person was going. */
export function SignInForm({ to, isDemo }: Readonly<{ to: string; isDemo: boolean }>) {
  const words = useWords().entry
  const router = useRouter()
  const { isWide } = useWidth()
  const form = useForm({ email: '', password: '' })
  const signIn = useAct(auth.signIn)
  const resend = useAct(() => {
    keepReturnPath(to)
    return auth.sendVerification(form.values.email.trim(), '/verify')
  })

  const submit = async () => {
    if (!form.report(firstProblems(signInSchema, form.values))) return
    const result = await signIn.run({ ...form.values, email: form.values.email.trim() })
    if (!result.ok) return void form.report(result.reason.fields)
    await loadSession()
    router.replace(to as never)
  }
  const isUnverified = signIn.refusal?.code === 'address-unverified'

  return (
    <View style={{ flexDirection: isWide ? 'row' : 'column', columnGap: 72, rowGap: space.wide }}>
      <View style={{ flex: isWide ? 1 : undefined, maxWidth: 620, gap: space.wide }}>
        {isUnverified ? (
          <Notice
            title={words.signIn.unverifiedTitle}
            action={
              <Button
                label={words.signIn.sendAgain}
                isBusy={resend.isBusy}
                onPress={() => void resend.run(undefined)}
              />
            }
          >
            {words.signIn.unverified(form.values.email)}
          </Notice>
        ) : (
          <RefusalNotice refusal={signIn.refusal} />
        )}
        <Form label={words.signIn.title} onSubmit={() => void submit()}>
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
            kind="password"
            autoComplete="current-password"
            maxLength={128}
          />
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.one }}>
            <Button kind="go" label={words.signIn.go} isSubmit isBusy={signIn.isBusy} />
            <LinkText href="/forgot" label={words.signIn.forgot} style={{ paddingVertical: 10 }} />
          </View>
        </Form>
        <View style={{ gap: space.small }}>
          <Txt tone="lead">
            {`${words.signIn.noAccount} `}
            <LinkText href={`/sign-up?to=${encodeURIComponent(to)}`} label={words.signIn.makeOne} />
          </Txt>
          <Txt tone="lead">
            {`${words.signIn.guest} `}
            <LinkText href="/join" label={words.signIn.join} />
          </Txt>
        </View>
      </View>
      {isDemo ? (
        <View style={{ flex: isWide ? 1 : undefined, maxWidth: 620 }}>
          <DemoPeople
            onChoose={(email, password) => form.set({ email, password })}
            chosen={form.values.email}
          />
        </View>
      ) : null}
    </View>
  )
}

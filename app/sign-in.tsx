import { Redirect, useLocalSearchParams } from 'expo-router'
import { SignInForm } from '@/components/entry/sign-in-form'
import { Frame, parseReturnPath, useSession } from '@/components/session'
import { useWords } from '@/components/words'

export default function SignIn() {
  const words = useWords().entry.signIn
  const { to } = useLocalSearchParams<{ to?: string }>()
  const { me, isDemo } = useSession()
  const target = parseReturnPath(to)
  if (me && !me.isGuest) return <Redirect href={target as never} />
  return (
    <Frame me={null} title={words.title}>
      <SignInForm to={target} isDemo={isDemo} />
    </Frame>
  )
}

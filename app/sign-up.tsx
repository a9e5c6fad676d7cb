import { useLocalSearchParams } from 'expo-router'
import { SignUpForm } from '@/components/entry/sign-up-form'
import { Frame, parseReturnPath, useSession } from '@/components/session'
import { useWords } from '@/components/words'

export default function SignUp() {
  const words = useWords().entry.signUp
  const { to } = useLocalSearchParams<{ to?: string }>()
  const { isDemo } = useSession()
  return (
    <Frame me={null} title={words.title} width="text">
      <SignUpForm to={parseReturnPath(to)} isDemo={isDemo} />
    </Frame>
  )
}

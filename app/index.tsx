import { Page, LinkText } from '@/components/ui'
import { useWords } from '@/components/words'

export default function Landing() {
  const words = useWords().common
  return (
    <Page title={words.motto} width="text">
      <LinkText href="/sign-in" label={words.signIn} />
    </Page>
  )
}

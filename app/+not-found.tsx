import { LinkButton, Page } from '@/components/ui'
import { useWords } from '@/components/words'

export default function NotFound() {
  const words = useWords().common
  return (
    <Page title={words.notFound} lede={words.notFoundMore} width="text">
      <LinkButton href="/" label={words.goHome} />
    </Page>
  )
}

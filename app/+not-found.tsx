import { Frame, useSession } from '@/components/session'
import { LinkButton } from '@/components/ui'
import { useWords } from '@/components/words'

export default function NotFound() {
  const words = useWords().common
  const { me } = useSession()
  return (
    <Frame me={me && !me.isGuest ? me : null} title={words.notFound} lede={words.notFoundMore} width="text">
      <LinkButton href="/" label={words.goHome} />
    </Frame>
  )
}

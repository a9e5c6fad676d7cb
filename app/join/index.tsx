import { JoinScreen } from '@/components/join/join-screen'

export default function Join() {
  return <JoinScreen code={null} />
}

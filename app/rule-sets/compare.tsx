import { useLocalSearchParams } from 'expo-router'
import { ComparePage } from '@/components/rule-sets/compare-page'
import { SignedIn } from '@/components/session'

const USUAL = ['open-undergrad', 'fux-mann'] as const

export default function CompareRoute() {
  const { a, b } = useLocalSearchParams<{ a?: string; b?: string }>()
  const first = a ?? USUAL[0]
  const second = b ?? (first === USUAL[0] ? USUAL[1] : USUAL[0])
  return <SignedIn>{(me) => <ComparePage me={me} ids={[first, second]} />}</SignedIn>
}

import { View } from 'react-native'
import type { DeskBar } from '@/components/lesson/desk-bars'
import { firstPitch } from '@/components/lesson/spoken'
import { space } from '@/components/theme'
import { Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { BarNotes } from '@/shared/theory/note'

/** In the ladder's place where nothing can be written: what stands in the bar, and what is kept for the student. */
export function ClosedBar({ bar, hasOpen }: Readonly<{ bar: DeskBar; hasOpen: boolean }>) {
  const words = useWords()
  const spoken = (notes: BarNotes): string => {
    const pitch = firstPitch(notes)
    return pitch ? words.lesson.pitchPrinted(pitch) : ''
  }
  const sentences: string[] = []
  if (bar.kind === 'set-aside') sentences.push(words.desk.closed.setAside)
  if (bar.kind === 'closed') {
    sentences.push(
      bar.adopted ? words.desk.closed.frozenAdopted(spoken(bar.adopted)) : words.desk.closed.frozenEmpty,
    )
    if (bar.draft) sentences.push(words.desk.closed.draft(spoken(bar.draft)))
  }
  if (!hasOpen && bar.kind !== 'open') sentences.push(words.desk.closed.nothingReleased)
  return (
    <View style={{ flex: 1, padding: space.one, gap: space.half }}>
      {sentences.map((sentence) => (
        <Txt key={sentence} tone="lead">
          {sentence}
        </Txt>
      ))}
    </View>
  )
}

import { useRouter } from 'expo-router'
import { useState } from 'react'
import { View } from 'react-native'
import { formatCode, parseTypedCode } from '@/components/join/code-entry'
import { space, useWidth } from '@/components/theme'
import { Button, Field, Form, LinkText } from '@/components/ui'
import { useWords } from '@/components/words'
import { CODE_LENGTH } from '@/shared/api/lessons'

/** The quickest way into a lesson: six syllables and Enter. */
export function JoinField() {
  const words = useWords().entry.landing
  const { isWide } = useWidth()
  const router = useRouter()
  const [typed, setTyped] = useState('')
  const [problem, setProblem] = useState<string | null>(null)

  const join = () => {
    const parsed = parseTypedCode(typed)
    if (!parsed.ok) {
      return setProblem(
        parsed.reason.kind === 'too-many' ? words.tooMany : words.notSyllable(parsed.reason.text),
      )
    }
    const missing = CODE_LENGTH - parsed.value.length
    if (missing > 0) return setProblem(words.tooFew(missing))
    router.push(`/join/${formatCode(parsed.value)}` as never)
  }

  return (
    <Form label={words.joinLabel} onSubmit={join} gapPx={space.half}>
      <Field
        label={words.joinLabel}
        value={typed}
        onChangeText={(text) => {
          setTyped(text)
          setProblem(null)
        }}
        problem={problem}
        hint={words.joinHint}
        maxLength={80}
        autoComplete="off"
        isVerbatim
        isLarge
      />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.one }}>
        <View style={isWide ? null : { flexGrow: 1 }}>
          <Button kind="go" label={words.joinGo} isSubmit isWide={!isWide} />
        </View>
        <LinkText href="/join" label={words.tapInstead} style={{ paddingVertical: 10 }} />
      </View>
    </Form>
  )
}

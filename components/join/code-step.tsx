import { useState } from 'react'
import { View } from 'react-native'
import { leading, space } from '@/components/theme'
import { usePlayer } from '@/components/sound'
import { Button, Field, Form, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { CODE_LENGTH, CODE_SYLLABLES, type Syllable } from '@/shared/api/lessons'
import {
  formatCode,
  isComplete,
  parseTypedCode,
  withoutLast,
  withSyllable,
  type CodeEntry,
} from './code-entry'
import { EnteredCode } from './entered-code'
import { SyllableStaff } from './syllable-staff'

/** The scale that the seven lozenges climb. */
const SCALE = ['C4', 'D4', 'E4', 'F4', 'G4', 'A4', 'B4'] as const

/** The code of a lesson, tapped on a staff or typed. Six syllables are looked up by themselves. */
export function CodeStep({
  problem,
  isLooking,
  onCode,
}: Readonly<{ problem: string | null; isLooking: boolean; onCode: (code: string) => void }>) {
  const words = useWords().join
  const player = usePlayer()
  const [isTyping, setTyping] = useState(false)
  const [isSounding, setSounding] = useState(true)
  const sound = (syllable: Syllable) => {
    if (isSounding) player.strike(SCALE[CODE_SYLLABLES.indexOf(syllable)] ?? 'C4')
  }
  return (
    <View style={{ flex: 1, gap: space.small }}>
      {isTyping ? (
        <TypedCode problem={problem} isLooking={isLooking} onCode={onCode} />
      ) : (
        <TappedCode problem={problem} isLooking={isLooking} onCode={onCode} onTap={sound} />
      )}
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          justifyContent: 'space-between',
          marginHorizontal: -space.small,
          marginTop: space.small,
        }}
      >
        <Button
          kind="quiet"
          label={isTyping ? words.tapInstead : words.typeInstead}
          onPress={() => setTyping(!isTyping)}
        />
        {isTyping ? null : (
          <Button
            kind="quiet"
            label={isSounding ? words.soundOff : words.soundOn}
            onPress={() => {
              if (isSounding) player.stop()
              setSounding(!isSounding)
            }}
          />
        )}
      </View>
      <Txt kind="note" tone="lead">
        {words.scan}
      </Txt>
    </View>
  )
}

type StepProps = Readonly<{ problem: string | null; isLooking: boolean; onCode: (code: string) => void }>

function TappedCode({
  problem,
  isLooking,
  onCode,
  onTap,
}: StepProps & Readonly<{ onTap: (syllable: Syllable) => void }>) {
  const [entry, setEntry] = useState<CodeEntry>([])
  // A code that was refused is replaced by the next tap, not added to.
  const isSpent = isComplete(entry) && problem !== null

  const tap = (syllable: Syllable) => {
    onTap(syllable)
    const before = isSpent ? [] : entry
    const next = withSyllable(before, syllable)
    setEntry(next)
    if (isComplete(next) && !isComplete(before)) onCode(formatCode(next))
  }

  return (
    <View style={{ flex: 1, gap: space.small }}>
      <EnteredCode entry={entry} hasProblem={isSpent} onTakeBack={() => setEntry(withoutLast(entry))} />
      <CodeStatus problem={problem} isLooking={isLooking} />
      <View style={{ flex: 1, minHeight: space.small }} />
      <SyllableStaff lastTapped={entry.at(-1) ?? null} isDisabled={isLooking} onTap={tap} />
    </View>
  )
}

function TypedCode({ problem, isLooking, onCode }: StepProps) {
  const words = useWords().join
  const [text, setText] = useState('')
  const [own, setOwn] = useState<string | null>(null)
  const [sent, setSent] = useState<string | null>(null)

  const submit = () => {
    const read = parseTypedCode(text)
    if (!read.ok) {
      const { reason } = read
      return setOwn(
        reason.kind === 'too-many' ? words.problems.tooMany : words.problems.notASyllable(reason.text),
      )
    }
    if (!isComplete(read.value)) return setOwn(words.problems.tooFew(CODE_LENGTH - read.value.length))
    setOwn(null)
    setSent(text)
    onCode(formatCode(read.value))
  }

  return (
    <View style={{ flex: 1, paddingTop: space.half }}>
      <Form label={words.typedLabel} onSubmit={submit}>
        <Field
          label={words.typedLabel}
          hint={words.typedHint}
          value={text}
          onChangeText={(next) => {
            setText(next)
            setOwn(null)
          }}
          problem={own ?? (sent === text ? problem : null)}
          isVerbatim
          isLarge
          hasFocus
          maxLength={60}
          autoComplete="off"
          name="code"
        />
        <Button label={words.typedGo} kind="go" isSubmit isWide isBusy={isLooking} />
      </Form>
    </View>
  )
}

/** Kept two lines high, so that nothing moves when it speaks. */
function CodeStatus({ problem, isLooking }: Readonly<{ problem: string | null; isLooking: boolean }>) {
  const words = useWords().join
  return (
    <View style={{ minHeight: 2 * leading.note }} role={problem ? 'alert' : 'status'}>
      {problem || isLooking ? (
        <Txt kind="note" tone={problem ? 'minium' : 'lead'}>
          {problem ?? words.looking}
        </Txt>
      ) : null}
    </View>
  )
}

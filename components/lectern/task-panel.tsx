import { useEffect, useState } from 'react'
import { View } from 'react-native'
import { space } from '@/components/theme'
import { Button, Field, Form, Heading, Select, Toggle, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { MAX_PROMPT_CHARACTERS, type StageSettings } from '@/shared/wire/documents'

const WAYS_TOLD_TO = ['nobody', 'wall', 'everyone'] as const satisfies readonly StageSettings['showsWays'][]

/** What the class is to do, and what may be seen. A prompt being written stays when a colleague changes theirs. */
export function TaskPanel({
  stage,
  suggestion,
  onStage,
}: Readonly<{
  stage: StageSettings
  /** A sentence that fits the bars in question, or null. */
  suggestion: string | null
  onStage: (patch: Partial<StageSettings>) => void
}>) {
  const words = useWords().lectern.stage
  const ways = useWords().ways
  const [text, setText] = useState(stage.prompt)
  const [base, setBase] = useState(stage.prompt)

  useEffect(() => {
    if (stage.prompt === base) return
    setText((before) => (before === base ? stage.prompt : before))
    setBase(stage.prompt)
  }, [stage.prompt, base])

  const isEdited = text.trim() !== stage.prompt
  return (
    <View style={{ gap: space.half }}>
      <Heading level={2} kind="text">
        {words.title}
      </Heading>
      <Form label={words.title} gapPx={space.small} onSubmit={() => onStage({ prompt: text.trim() })}>
        <Field
          label={words.promptLabel}
          value={text}
          onChangeText={setText}
          rows={4}
          maxLength={MAX_PROMPT_CHARACTERS}
          isOptional={false}
          hint={words.promptHint}
        />
        <Button
          label={isEdited ? words.promptEdited : words.promptSaved}
          kind={isEdited ? 'go' : 'plain'}
          isDisabled={!isEdited}
          isSubmit
          isWide
        />
      </Form>
      {suggestion && suggestion !== text ? (
        <View style={{ gap: space.tiny }}>
          <Txt kind="note" tone="lead" face="italic">
            {suggestion}
          </Txt>
          <Button kind="quiet" label={words.suggestion} onPress={() => setText(suggestion)} />
        </View>
      ) : null}
      <View role="group" aria-label={words.shows} style={{ gap: space.small }}>
        <Toggle
          label={words.findings}
          value={stage.showsFindings}
          onChange={(showsFindings) => onStage({ showsFindings })}
        />
        <Toggle
          label={words.spread}
          value={stage.showsSpread}
          onChange={(showsSpread) => onStage({ showsSpread })}
        />
        <Toggle
          label={words.names}
          value={stage.showsNames}
          onChange={(showsNames) => onStage({ showsNames })}
        />
        <Select
          label={ways.title}
          value={stage.showsWays}
          options={WAYS_TOLD_TO.map((value) => ({ value, label: ways.toldTo[value] }))}
          onChange={(showsWays) => onStage({ showsWays })}
        />
      </View>
    </View>
  )
}

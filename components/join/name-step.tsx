import { useState } from 'react'
import { View } from 'react-native'
import { space } from '@/components/theme'
import { Button, Field, Form, Txt } from '@/components/ui'
import { useWords } from '@/components/words'

/** A guest's own name, asked once the lesson is found. Kept as typed when it is refused. */
export function NameStep({
  title,
  problem,
  isBusy,
  onName,
  onBack,
}: Readonly<{
  title: string
  problem: string | null
  isBusy: boolean
  onName: (name: string) => void
  onBack: () => void
}>) {
  const words = useWords().join
  const [name, setName] = useState('')
  return (
    <Form label={words.nameTitle} onSubmit={() => onName(name)}>
      <Txt tone="lead">{words.nameLead(title)}</Txt>
      <Field
        label={words.nameLabel}
        hint={words.nameHint}
        value={name}
        onChangeText={setName}
        problem={problem}
        autoComplete="name"
        name="name"
        isLarge
        hasFocus
      />
      <Button label={words.nameGo} kind="go" isSubmit isWide isBusy={isBusy} />
      <View style={{ marginLeft: -space.small }}>
        <Button label={words.otherCode} kind="quiet" onPress={onBack} />
      </View>
      <Txt kind="note" tone="lead">
        {words.kept}
      </Txt>
    </Form>
  )
}

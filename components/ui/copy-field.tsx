import { useState } from 'react'
import { View } from 'react-native'
import { space } from '@/components/theme'
import { useWords } from '@/components/words'
import { Button } from './button'
import { Field } from './field'

/** Something to be copied: in a field, so that it can be taken by hand where the clipboard is refused. */
export function CopyField({ label, value, hint }: Readonly<{ label: string; value: string; hint?: string }>) {
  const words = useWords().common
  const [isCopied, setCopied] = useState(false)
  return (
    <View style={{ gap: space.small }}>
      <Field label={label} value={value} onChangeText={() => undefined} hint={hint} isVerbatim />
      <Button
        label={isCopied ? words.copied : words.copy}
        onPress={() => {
          navigator.clipboard?.writeText(value).then(
            () => setCopied(true),
            () => setCopied(false),
          )
        }}
      />
    </View>
  )
}

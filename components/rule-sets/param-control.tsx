import { useState } from 'react'
import { View } from 'react-native'
import { Field, Select, Toggle } from '@/components/ui'
import { useWords } from '@/components/words'
import { formatParam, parseParam, type ParamField } from './params-fields'

/** One parameter of a rule as the control its schema asks for. */
export function ParamControl({
  field,
  value,
  hasProblem,
  onChange,
}: Readonly<{ field: ParamField; value: unknown; hasProblem: boolean; onChange: (value: unknown) => void }>) {
  const words = useWords().setup
  const { control } = field
  const [text, setText] = useState(() => formatParam(control, value))
  const [isUnread, setUnread] = useState(false)
  const hint = field.description ?? undefined
  if (control.kind === 'switch')
    return <Toggle label={field.label} value={value === true} onChange={onChange} hint={hint} />
  if (control.kind === 'choice')
    return (
      <View style={{ width: 280, maxWidth: '100%' }}>
        <Select
          label={field.label}
          value={String(value)}
          options={control.options.map((option) => ({ value: option, label: option.replaceAll('-', ' ') }))}
          onChange={onChange}
          hint={hint}
        />
      </View>
    )
  return (
    <View style={{ width: control.kind === 'list' || control.kind === 'json' ? 280 : 150, maxWidth: '100%' }}>
      <Field
        label={field.label}
        value={text}
        isVerbatim
        hint={control.kind === 'list' && control.options ? words.paramList(control.options) : hint}
        problem={isUnread || hasProblem ? words.paramProblem : null}
        onChangeText={(next) => {
          setText(next)
          const read = parseParam(control, next)
          setUnread(read === undefined)
          if (read !== undefined) onChange(read)
        }}
      />
    </View>
  )
}

import { useId } from 'react'
import { View } from 'react-native'
import { CORNER_PX, fonts, leading, RULE_PX, space, type, useTarget, useTheme } from '@/components/theme'
import type { Option } from './choice'
import { Txt } from './txt'

/** One of many, in the platform's own list. */
export function Select<Value extends string>({
  label,
  value,
  options,
  onChange,
  isLabelHidden = false,
  isDisabled = false,
  hint,
  problem,
}: Readonly<{
  label: string
  value: Value
  options: readonly Option<Value>[]
  onChange: (value: Value) => void
  isLabelHidden?: boolean
  isDisabled?: boolean
  hint?: string
  problem?: string | null
}>) {
  const { colors } = useTheme()
  const target = useTarget()
  const id = useId()
  const about = hint || problem ? `${id}-about` : undefined
  return (
    <View style={{ gap: space.tiny + 1, minWidth: 0 }}>
      {isLabelHidden ? null : (
        <label htmlFor={id}>
          <Txt kind="note" isStrong>
            {label}
          </Txt>
        </label>
      )}
      <View>
        <select
          id={id}
          aria-label={isLabelHidden ? label : undefined}
          aria-describedby={about}
          aria-invalid={problem ? true : undefined}
          value={value}
          disabled={isDisabled}
          onChange={(event) => onChange(event.target.value as Value)}
          style={{
            appearance: 'none',
            width: '100%',
            minHeight: target.heightPx,
            padding: `0 ${space.double}px 0 ${space.half}px`,
            border: `${RULE_PX}px solid ${problem ? colors.minium : colors.edge}`,
            borderRadius: CORNER_PX,
            background: colors.leaf,
            color: colors.lampblack,
            font: `${type[target.kind]}px/${leading[target.kind]}px ${fonts.AlegreyaSans}`,
            textOverflow: 'ellipsis',
            cursor: 'pointer',
          }}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
        <View
          style={{
            position: 'absolute',
            right: space.half,
            top: (target.heightPx - leading.note) / 2,
            pointerEvents: 'none',
          }}
          aria-hidden
        >
          <Txt tone="lead" kind="note">
            ↓
          </Txt>
        </View>
      </View>
      {about ? (
        <Txt id={about} kind="note" tone={problem ? 'minium' : 'lead'}>
          {problem || hint}
        </Txt>
      ) : null}
    </View>
  )
}

import { useId } from 'react'
import { View } from 'react-native'
import { space, TOUCH_TARGET_PX, useTheme } from '@/components/theme'
import { Lozenge } from './lozenge'
import { Txt } from './txt'

/** On or off, at once. The whole line is the target. */
export function Toggle({
  label,
  value,
  onChange,
  hint,
  isDisabled = false,
  spoken,
}: Readonly<{
  label: string
  /** Its name for a screen reader, where the words beside it do not say what is switched. */
  spoken?: string
  value: boolean
  onChange: (value: boolean) => void
  hint?: string
  isDisabled?: boolean
}>) {
  const { colors } = useTheme()
  const id = useId()
  return (
    <label
      style={{
        display: 'flex',
        alignItems: 'center',
        gap: space.half,
        minHeight: TOUCH_TARGET_PX,
        position: 'relative',
        cursor: isDisabled ? 'auto' : 'pointer',
        opacity: isDisabled ? 0.55 : 1,
      }}
    >
      <input
        type="checkbox"
        role="switch"
        className="covers"
        checked={value}
        disabled={isDisabled}
        aria-label={spoken}
        aria-describedby={hint ? id : undefined}
        onChange={(event) => onChange(event.target.checked)}
        style={{ cursor: 'inherit' }}
      />
      <View
        style={{
          width: 40,
          flexShrink: 0,
          height: 22,
          justifyContent: 'center',
          alignItems: value ? 'flex-end' : 'flex-start',
        }}
        aria-hidden
      >
        <View
          style={{
            position: 'absolute',
            left: 0,
            right: 0,
            height: 2,
            backgroundColor: value ? colors.verdigris : colors.edge,
          }}
        />
        <View style={{ backgroundColor: colors.vellum }}>
          <Lozenge kind={value ? 'filled' : 'hollow'} tone={value ? 'verdigris' : 'lead'} sizePx={20} />
        </View>
      </View>
      <View style={{ flexShrink: 1 }}>
        <Txt>{label}</Txt>
        {hint ? (
          <Txt id={id} kind="note" tone="lead">
            {hint}
          </Txt>
        ) : null}
      </View>
    </label>
  )
}

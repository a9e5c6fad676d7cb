import { useId } from 'react'
import { View } from 'react-native'
import { space, TOUCH_TARGET_PX, useTheme } from '@/components/theme'
import { Txt } from '@/components/ui/txt'

/** A labelled slider: the browser's own, so that keyboard, finger and screen reader know it. `text` says its value in words. */
export function Range({
  label,
  hint,
  text,
  value,
  min,
  max,
  step,
  onChange,
}: Readonly<{
  label: string
  hint?: string
  text: string
  value: number
  min: number
  max: number
  step: number
  onChange: (value: number) => void
}>) {
  const { colors } = useTheme()
  const id = useId()
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.half, minHeight: TOUCH_TARGET_PX }}>
      <label htmlFor={id} title={hint}>
        <Txt kind="note" tone="lead">
          {label}
        </Txt>
      </label>
      <input
        id={id}
        type="range"
        value={value}
        min={min}
        max={max}
        step={step}
        aria-valuetext={text}
        aria-description={hint}
        onChange={(event) => onChange(Number(event.target.value))}
        style={{ width: 128, minWidth: 72, height: TOUCH_TARGET_PX, margin: 0, accentColor: colors.azurite }}
      />
      {/* Room for the widest value, so that sliding moves nothing beside it. */}
      <View style={{ minWidth: 44 }} aria-hidden>
        <Txt kind="note" isTabular>
          {text}
        </Txt>
      </View>
    </View>
  )
}

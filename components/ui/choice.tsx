import { useId } from 'react'
import { View } from 'react-native'
import { CORNER_PX, fonts, leading, RULE_PX, space, type, useTarget, useTheme } from '@/components/theme'
import { Lozenge } from './lozenge'
import { Txt } from './txt'

export type Option<Value extends string> = Readonly<{ value: Value; label: string }>

/** One of a few, all in sight: real radio buttons drawn as segments. Arrow keys move among them. */
export function Choice<Value extends string>({
  label,
  value,
  options,
  onChange,
  isLabelHidden = false,
  isDisabled = false,
  problem,
}: Readonly<{
  label: string
  value: Value
  options: readonly Option<Value>[]
  onChange: (value: Value) => void
  isLabelHidden?: boolean
  isDisabled?: boolean
  problem?: string | null
}>) {
  const { colors } = useTheme()
  const target = useTarget()
  const name = useId()
  return (
    <View role="radiogroup" aria-labelledby={`${name}-label`} style={{ gap: space.tiny + 1 }}>
      <Txt
        id={`${name}-label`}
        kind="note"
        isStrong
        style={isLabelHidden ? { position: 'absolute', width: 1, height: 1, overflow: 'hidden' } : null}
      >
        {label}
      </Txt>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignSelf: 'flex-start', paddingLeft: RULE_PX }}>
        {options.map((option, place) => {
          const isOn = option.value === value
          return (
            <label
              key={option.value}
              style={{
                display: 'flex',
                alignItems: 'center',
                justifyContent: 'center',
                gap: space.small,
                minHeight: target.heightPx,
                padding: `0 ${space.one - 2}px`,
                // Neighbours share an edge, so that they read as one control.
                marginLeft: -RULE_PX,
                marginBottom: -RULE_PX,
                border: `${RULE_PX}px solid ${isOn ? colors.lampblack : colors.edge}`,
                borderRadius:
                  options.length === 1
                    ? CORNER_PX
                    : place === 0
                      ? `${CORNER_PX}px 0 0 ${CORNER_PX}px`
                      : place === options.length - 1
                        ? `0 ${CORNER_PX}px ${CORNER_PX}px 0`
                        : 0,
                position: 'relative',
                zIndex: isOn ? 1 : 0,
                background: isOn ? colors.leaf : 'transparent',
                color: isOn ? colors.lampblack : colors.lead,
                font: `${type[target.kind]}px/${leading[target.kind]}px ${isOn ? fonts.AlegreyaSansMedium : fonts.AlegreyaSans}`,
                cursor: isDisabled ? 'auto' : 'pointer',
                opacity: isDisabled ? 0.55 : 1,
              }}
            >
              <input
                type="radio"
                name={name}
                value={option.value}
                checked={isOn}
                disabled={isDisabled}
                onChange={() => onChange(option.value)}
                className="covers"
                style={{ cursor: 'inherit' }}
              />
              <Lozenge kind={isOn ? 'filled' : 'hollow'} tone={isOn ? 'azurite' : 'lead'} sizePx={10} />
              {option.label}
            </label>
          )
        })}
      </View>
      {problem ? (
        <Txt kind="note" tone="minium" role="alert">
          {problem}
        </Txt>
      ) : null}
    </View>
  )
}

import { useContext, useId, useState, type CSSProperties } from 'react'
import { View } from 'react-native'
import {
  CORNER_PX,
  fonts,
  leading,
  RULE_PX,
  space,
  TOUCH_TARGET_PX,
  type,
  useTarget,
  useTheme,
} from '@/components/theme'
import { useWords } from '@/components/words'
import { FormContext } from './form'
import { Lozenge } from './lozenge'
import { Txt } from './txt'

export type FieldProps = Readonly<{
  label: string
  value: string
  onChangeText: (text: string) => void
  /** What is wrong, in words; shown beside the field and read with it. */
  problem?: string | null
  hint?: string
  kind?: 'text' | 'email' | 'password' | 'search'
  /** Value of the `autocomplete` attribute. */
  autoComplete?: string
  /** More than one: a box of so many lines. */
  rows?: number
  maxLength?: number
  isOptional?: boolean
  isDisabled?: boolean
  /** Takes the focus when it appears: only the first field of a page made for it. */
  hasFocus?: boolean
  /** Hides the label from sight; it is still read. */
  isLabelHidden?: boolean
  /** Larger, in the serif: for the one field a page is for. */
  isLarge?: boolean
  placeholder?: string
  name?: string
  onBlur?: () => void
  /** Switches off the phone's guessing: for codes, notes, addresses. */
  isVerbatim?: boolean
}>

/** A labelled field. The room for a problem is kept only once there is a hint or a problem; problems take the hint's place. */
export function Field(props: FieldProps) {
  const { label, value, onChangeText, problem, hint, kind = 'text', rows = 1, isOptional = false } = props
  const { colors } = useTheme()
  const words = useWords().common
  const form = useContext(FormContext)
  const id = useId()
  const [isShown, setShown] = useState(false)
  const [isFocused, setFocused] = useState(false)
  const { heightPx } = useTarget()
  const fieldPx = heightPx + (props.isLarge ? 12 : 0)
  const about = problem || hint ? `${id}-about` : undefined

  const style: CSSProperties = {
    font: 'inherit',
    fontFamily: props.isLarge ? fonts.Alegreya : fonts.AlegreyaSans,
    fontSize: props.isLarge ? type.large : type.text,
    lineHeight: `${props.isLarge ? leading.large : leading.text}px`,
    fontVariantNumeric: 'lining-nums',
    color: colors.lampblack,
    backgroundColor: colors.leaf,
    border: `${RULE_PX}px solid ${problem ? colors.minium : isFocused ? colors.lampblack : colors.edge}`,
    borderRadius: CORNER_PX,
    padding: `${(fieldPx - (props.isLarge ? leading.large : leading.text) - 2 * RULE_PX) / 2}px ${space.half}px`,
    paddingRight: kind === 'password' ? 72 : space.half,
    width: '100%',
    minWidth: 0,
    minHeight: fieldPx,
    margin: 0,
    resize: 'vertical',
    appearance: 'none',
    opacity: props.isDisabled ? 0.55 : 1,
  }
  const shared = {
    id,
    value,
    style,
    name: props.name,
    maxLength: props.maxLength,
    placeholder: props.placeholder,
    autoComplete: props.autoComplete,
    autoFocus: props.hasFocus,
    disabled: props.isDisabled,
    'aria-invalid': problem ? true : undefined,
    'aria-describedby': about,
    'aria-required': isOptional ? undefined : kind === 'search' ? undefined : true,
    onChange: (event: { target: { value: string } }) => onChangeText(event.target.value),
    onFocus: () => setFocused(true),
    onBlur: () => {
      setFocused(false)
      props.onBlur?.()
    },
    ...(props.isVerbatim || kind !== 'text'
      ? { autoCapitalize: 'none', autoCorrect: 'off', spellCheck: false }
      : {}),
  } as const

  return (
    <View style={{ gap: space.tiny + 1, minWidth: 0 }}>
      <label
        htmlFor={id}
        style={
          props.isLabelHidden
            ? { position: 'absolute', width: 1, height: 1, overflow: 'hidden', clipPath: 'inset(50%)' }
            : undefined
        }
      >
        <Txt kind="note" isStrong>
          {label}
          {isOptional ? (
            <Txt kind="note" tone="lead">
              {` (${words.optional})`}
            </Txt>
          ) : null}
        </Txt>
      </label>
      <View>
        {rows > 1 ? (
          <textarea {...shared} rows={rows} dir="auto" />
        ) : (
          <input
            {...shared}
            dir={kind === 'text' ? 'auto' : undefined}
            type={kind === 'password' && isShown ? 'text' : kind}
            onKeyDown={(event) => {
              if (event.key !== 'Enter' || event.nativeEvent.isComposing) return
              event.preventDefault()
              form?.submit()
            }}
          />
        )}
        {kind === 'password' ? (
          <button
            type="button"
            aria-pressed={isShown}
            aria-label={`${isShown ? words.hide : words.show}: ${label}`}
            onClick={() => setShown(!isShown)}
            style={{
              position: 'absolute',
              right: 0,
              top: 0,
              height: fieldPx,
              minWidth: TOUCH_TARGET_PX,
              padding: `0 ${space.half}px`,
              border: 0,
              background: 'none',
              color: colors.azurite,
              font: `${type.note}px ${fonts.AlegreyaSansMedium}`,
              cursor: 'pointer',
            }}
          >
            {isShown ? words.hide : words.show}
          </button>
        ) : null}
      </View>
      {about ? (
        <View id={about} style={{ flexDirection: 'row', gap: space.small, alignItems: 'baseline' }}>
          {problem ? <Lozenge tone="minium" sizePx={10} /> : null}
          <Txt kind="note" tone={problem ? 'minium' : 'lead'} style={{ flexShrink: 1 }}>
            {problem || hint}
          </Txt>
        </View>
      ) : null}
    </View>
  )
}

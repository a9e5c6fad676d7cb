import { useContext } from 'react'
import { Pressable, Text, View } from 'react-native'
import { createStyles, CORNER_PX, fonts, leading, RULE_PX, space, useTarget, type } from '@/components/theme'
import { FormContext } from './form'

export type ButtonKind = 'plain' | 'go' | 'danger' | 'quiet'

export type ButtonProps = Readonly<{
  label: string
  onPress?: () => void
  /** `go`: the one act this place is for. `danger`: cannot be undone. `quiet`: no frame. */
  kind?: ButtonKind
  isBusy?: boolean
  isDisabled?: boolean
  /** Sends the form it stands in. */
  isSubmit?: boolean
  /** Fills the width it is given. */
  isWide?: boolean
  /** A pressed or unpressed button. */
  isOn?: boolean
  /** Longer name for a screen reader, when the label alone does not say what is acted upon. */
  hint?: string
  hasPopup?: 'dialog' | 'menu'
}>

/** A button. Never shorter than a finger. While busy it keeps its width and its place. */
export function Button({
  label,
  onPress,
  kind = 'plain',
  isBusy = false,
  isDisabled = false,
  isSubmit = false,
  isWide = false,
  isOn,
  hint,
  hasPopup,
}: ButtonProps) {
  const form = useContext(FormContext)
  const styles = useButtonStyles()
  const target = useTarget()
  const isOff = isDisabled || isBusy
  const ink = isDisabled
    ? styles.offInk
    : kind === 'go' || isOn
      ? styles.onGround
      : kind === 'danger'
        ? styles.dangerInk
        : kind === 'quiet'
          ? styles.quietInk
          : styles.ink
  return (
    <Pressable
      role="button"
      aria-label={hint}
      aria-busy={isBusy}
      aria-disabled={isOff}
      aria-pressed={isOn}
      {...(hasPopup ? { 'aria-haspopup': hasPopup } : {})}
      onPress={() => {
        // Stays focusable while off, so that a keyboard does not lose its place.
        if (isOff) return
        if (isSubmit) form?.submit()
        onPress?.()
      }}
      style={(state) => {
        const { hovered } = state as { hovered?: boolean }
        return [
          styles.box,
          { minHeight: target.heightPx, minWidth: target.heightPx },
          kind === 'go' && styles.go,
          kind === 'danger' && styles.danger,
          kind === 'quiet' && styles.quiet,
          isOn && styles.on,
          hovered && !isOff && (kind === 'go' || isOn ? styles.hoveredFill : styles.hovered),
          state.pressed && !isOff && styles.pressed,
          isDisabled && styles.off,
          isWide && styles.wide,
        ]
      }}
    >
      <Text style={[styles.label, { fontSize: type[target.kind], lineHeight: leading[target.kind] }, ink]}>
        {label}
      </Text>
      {isBusy ? <View style={[styles.busy, kind === 'go' ? styles.busyOnGround : null]} /> : null}
    </Pressable>
  )
}

const useButtonStyles = createStyles((colors) => ({
  box: {
    paddingHorizontal: space.one - 2,
    paddingVertical: space.tiny,
    borderWidth: RULE_PX,
    borderColor: colors.edge,
    borderRadius: CORNER_PX,
    alignItems: 'center',
    justifyContent: 'center',
    alignSelf: 'flex-start',
    cursor: 'pointer',
  },
  wide: { alignSelf: 'stretch' },
  go: { minWidth: 96, backgroundColor: colors.verdigris, borderColor: colors.verdigris },
  danger: { borderColor: colors.minium },
  quiet: { borderColor: 'transparent', paddingHorizontal: space.small },
  on: { backgroundColor: colors.azurite, borderColor: colors.azurite },
  hovered: { backgroundColor: colors.leaf, borderColor: colors.lampblack },
  hoveredFill: { opacity: 0.9 },
  pressed: { transform: [{ translateY: 1 }] },
  // Not by fading: its words must still be read.
  off: {
    backgroundColor: 'transparent',
    borderColor: colors.hairline,
    borderStyle: 'dashed',
    cursor: 'auto',
  },
  label: {
    fontFamily: fonts.AlegreyaSansMedium,
    textAlign: 'center',
    userSelect: 'none',
  },
  ink: { color: colors.lampblack },
  onGround: { color: colors.vellum },
  offInk: { color: colors.lead },
  dangerInk: { color: colors.minium },
  quietInk: { color: colors.azurite },
  busy: {
    position: 'absolute',
    left: space.small,
    right: space.small,
    bottom: 3,
    height: 2,
    backgroundColor: colors.lampblack,
  },
  busyOnGround: { backgroundColor: colors.vellum },
}))

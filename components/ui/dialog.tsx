import { useEffect, useId, useRef, type ReactNode } from 'react'
import { View } from 'react-native'
import { CORNER_PX, RULE_PX, space, useTheme } from '@/components/theme'
import { Heading } from './heading'

/** A question put over the page, in the browser's own modal: focus is held, Escape closes, the page behind is inert. */
export function Dialog({
  title,
  isOpen,
  onClose,
  children,
  actions,
  widthPx = 520,
}: Readonly<{
  title: string
  isOpen: boolean
  onClose: () => void
  children: ReactNode
  /** Buttons, the safe one first. */
  actions?: ReactNode
  widthPx?: number
}>) {
  const { colors } = useTheme()
  const dialog = useRef<HTMLDialogElement>(null)
  const id = useId()

  useEffect(() => {
    const element = dialog.current
    if (!element) return
    if (isOpen && !element.open) element.showModal()
    if (!isOpen && element.open) element.close()
  }, [isOpen])

  return (
    <dialog
      ref={dialog}
      aria-labelledby={id}
      onClose={onClose}
      onClick={(event) => {
        if (event.target === dialog.current) onClose()
      }}
      style={{
        width: `min(${widthPx}px, calc(100vw - 24px))`,
        maxHeight: 'calc(100dvh - 24px)',
        padding: 0,
        border: `${RULE_PX}px solid ${colors.lampblack}`,
        borderRadius: CORNER_PX,
        background: colors.leaf,
        color: colors.lampblack,
      }}
    >
      {isOpen ? (
        <View style={{ padding: space.wide - space.tiny, gap: space.one }}>
          <Heading level={2} id={id}>
            {title}
          </Heading>
          {children}
          {actions ? <DialogActions>{actions}</DialogActions> : null}
        </View>
      ) : null}
    </dialog>
  )
}

/** The buttons at a dialog's foot, the safe one first. */
export function DialogActions({ children }: Readonly<{ children: ReactNode }>) {
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small, justifyContent: 'flex-end' }}>
      {children}
    </View>
  )
}

import { createContext, useMemo, useRef, type ReactNode } from 'react'
import { space } from '@/components/theme'

/** How a button or a field inside a form sends it. */
export const FormContext = createContext<Readonly<{ submit: () => void }> | null>(null)

/** A real form, so that Enter sends it and password managers know it. Never validates by itself: fields say it in words. */
export function Form({
  label,
  onSubmit,
  children,
  gapPx = space.one + space.tiny,
}: Readonly<{ label: string; onSubmit: () => void; children: ReactNode; gapPx?: number }>) {
  const form = useRef<HTMLFormElement>(null)
  const context = useMemo(() => ({ submit: () => form.current?.requestSubmit() }), [])
  return (
    <FormContext value={context}>
      <form
        ref={form}
        aria-label={label}
        noValidate
        style={{ display: 'flex', flexDirection: 'column', gap: gapPx, margin: 0, minWidth: 0 }}
        onSubmit={(event) => {
          event.preventDefault()
          onSubmit()
        }}
      >
        {children}
      </form>
    </FormContext>
  )
}

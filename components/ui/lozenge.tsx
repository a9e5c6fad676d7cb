import { useTheme } from '@/components/theme'
import type { Tone } from './txt'

/** The one shape that recurs. Filled and hollow say unlike things, so the meaning never hangs on colour alone. */
export function Lozenge({
  kind = 'filled',
  tone = 'azurite',
  sizePx = 12,
}: Readonly<{ kind?: 'filled' | 'hollow'; tone?: Tone; sizePx?: number }>) {
  const { colors } = useTheme()
  const color = colors[tone]
  return (
    <svg
      width={sizePx}
      height={sizePx}
      viewBox="0 0 12 12"
      aria-hidden
      style={{ display: 'block', flexShrink: 0 }}
    >
      {kind === 'filled' ? (
        <path d="M6 0 12 6 6 12 0 6Z" fill={color} />
      ) : (
        <path d="M6 1.2 10.8 6 6 10.8 1.2 6Z" fill="none" stroke={color} strokeWidth={1.6} />
      )}
    </svg>
  )
}

import { createContext, useCallback, useContext, useMemo, useState, type ReactNode } from 'react'
import { readGround, writeGround, type Ground } from './ground'
import { DARK, LIGHT, type Pigments } from './pigments'
import { useMedia } from './use-media'

export type Theme = Readonly<{
  colors: Pigments
  isDark: boolean
  /** True when the reader asked for less motion: show the end state at once. */
  isMotionReduced: boolean
  ground: Ground
  setGround: (ground: Ground) => void
}>

const ThemeContext = createContext<Theme | null>(null)

export function ThemeProvider({ children }: Readonly<{ children: ReactNode }>) {
  const [ground, setGroundState] = useState(readGround)
  const isSystemDark = useMedia('(prefers-color-scheme: dark)')
  const isMotionReduced = useMedia('(prefers-reduced-motion: reduce)')
  const isDark = ground === 'system' ? isSystemDark : ground === 'dark'
  const setGround = useCallback((next: Ground) => {
    writeGround(next)
    setGroundState(next)
  }, [])
  const theme = useMemo(
    () => ({ colors: isDark ? DARK : LIGHT, isDark, isMotionReduced, ground, setGround }),
    [isDark, isMotionReduced, ground, setGround],
  )
  return <ThemeContext value={theme}>{children}</ThemeContext>
}

export function useTheme(): Theme {
  const theme = useContext(ThemeContext)
  if (!theme) throw new Error('useTheme is asked outside ThemeProvider')
  return theme
}

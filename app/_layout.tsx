import { Slot } from 'expo-router'
import { ThemeProvider } from '@/components/theme'
import { SkipLink } from '@/components/ui/skip-link'

export { Stumbled as ErrorBoundary } from '@/components/ui/stumbled'

export default function Layout() {
  return (
    <ThemeProvider>
      <SkipLink />
      <Slot />
    </ThemeProvider>
  )
}

import type { ErrorBoundaryProps } from 'expo-router'
import { View } from 'react-native'
import { ThemeProvider } from '@/components/theme'
import { useWords } from '@/components/words'
import { Button } from './button'
import { Page } from './page'
import { Txt } from './txt'

/** What stands in for a page whose drawing failed. Stands outside the layout, so it brings its own theme. */
export function Stumbled({ retry }: ErrorBoundaryProps) {
  const words = useWords().common
  return (
    <ThemeProvider>
      <Page title={words.crashed} width="text">
        <View role="alert">
          <Txt>{words.crashedMore}</Txt>
        </View>
        <Button kind="go" label={words.reload} onPress={() => void retry()} />
        <Button label={words.goHome} onPress={() => window.location.assign('/')} />
      </Page>
    </ThemeProvider>
  )
}

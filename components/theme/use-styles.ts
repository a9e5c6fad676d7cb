import { StyleSheet } from 'react-native'
import type { Pigments } from './pigments'
import { useTheme } from './theme-provider'

type Named = Parameters<typeof StyleSheet.create>[0]

/**
 * Makes a hook of styles that follow the ground: made once for each, not at every drawing.
 * `const useBoxStyles = createStyles((colors) => ({ box: { borderColor: colors.hairline } }))`
 */
export function createStyles<Styles extends Named>(make: (colors: Pigments) => Styles): () => Styles {
  const made = new WeakMap<Pigments, Styles>()
  return function useStyles() {
    const { colors } = useTheme()
    let styles = made.get(colors)
    if (!styles) {
      styles = StyleSheet.create(make(colors) as never) as Styles
      made.set(colors, styles)
    }
    return styles
  }
}

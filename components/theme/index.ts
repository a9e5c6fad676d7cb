export { DARK, LIGHT, type Pigment, type Pigments } from './pigments'
export { contrastOf } from './contrast'
export {
  CORNER_PX,
  fonts,
  leading,
  MEASURE_PX,
  MOTION_MS,
  RULE_PX,
  space,
  TOUCH_TARGET_PX,
  type,
  WIDE_PX,
} from './scale'
export { GROUNDS, type Ground } from './ground'
export { ThemeProvider, useTheme, type Theme } from './theme-provider'
export { createStyles } from './use-styles'
export { useMedia } from './use-media'
export { useTarget, type Target } from './use-target'
export { useWidth } from './use-width'

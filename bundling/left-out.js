/**
 * Parts of packages that nothing here asks for but their own index files. The bundler does not shake them out, and a
 * phone on a school's network would wait for them. They are empty in the browser only; the server runs on the packages as they are.
 */
const WITHIN_REACT_NATIVE_WEB = 'react-native-web/dist/exports'

/** Views and services of react-native-web that some screen, or a package on the way to one, does use. */
const KEPT_EXPORTS = [
  'AccessibilityInfo',
  'AppRegistry',
  'AppState',
  'Appearance',
  'BackHandler',
  'Dimensions',
  'I18nManager',
  'Image',
  'Keyboard',
  'Linking',
  'NativeEventEmitter',
  'NativeModules',
  'PixelRatio',
  'Platform',
  'Pressable',
  'ScrollView',
  'StyleSheet',
  'Text',
  'TextInput',
  'UIManager',
  'View',
  'createElement',
  'findNodeHandle',
  'processColor',
  'render',
  'unmountComponentAtNode',
  'useColorScheme',
  'useLocaleContext',
  'useWindowDimensions',
]

const LEFT_OUT = [
  // Navigators with headers, tabs and cards: here a route is a page, drawn in a `Slot`.
  /\/expo-router\/build\/(stack\/index|layouts\/Tabs|layouts\/experimental-stack\/index(\.web)?)\.js$/,
  /\/react-navigation\/(native-stack\/views|bottom-tabs)\//,
  /\/expo-router\/build\/layouts\/stack-utils\/index\.js$/,
  /\/expo-router\/build\/native-tabs\//,
  /\/expo-router\/build\/standard-navigation\//,
  /\/react-native-screens\/lib\/module\/(?!index|flags)/,
  // A map of the routes, tools of development, and previews of links as phones of one maker show them.
  /\/expo-router\/build\/views\/(Sitemap|Toast)\.js$/,
  /\/expo-router\/build\/link\/(LinkWithPreview|elements)\.js$/,
  /\/expo-router\/build\/link\/preview\/(HrefPreview|native)\.js$/,
  /\/expo-router\/build\/react-navigation\/(core\/StaticNavigation|native\/(createStaticNavigation|ServerContainer))\.js$/,
  // Drawings read out of files and addresses, and their style sheets: ours are drawn from elements.
  /\/react-native-svg\/lib\/module\/(xml|deprecated|utils\/fetchData)\.js$/,
  // Presses on shapes: ours are pressed through the buttons that lie over them.
  /\/react-native-svg\/lib\/module\/lib\/SvgTouchableMixin\.js$/,
  new RegExp(`/${WITHIN_REACT_NATIVE_WEB}/(?!(?:${KEPT_EXPORTS.join('|')})/)\\w+/index\\.js$`),
]

/** Whether a file, its path written with slashes, is left out of what browsers load. */
const isLeftOut = (file) => LEFT_OUT.some((part) => part.test(file))

module.exports = { isLeftOut }

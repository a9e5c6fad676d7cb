const path = require('node:path')
const { getDefaultConfig } = require('expo/metro-config')

const config = getDefaultConfig(__dirname)

/**
 * Parts of packages that nothing here asks for but their own index files. The bundler does not shake them out, and a
 * phone on a school's network would wait for them. They are empty in the browser only; the server runs on the packages as they are.
 */
const LEFT_OUT = [
  // Messages of validation in fifty languages: ours come from the locale tables, by code.
  /[\\/]zod[\\/]v4[\\/]locales[\\/]index\.js$/,
  // Schemas out of JSON Schema, and the compiler of validators, which a content security policy forbids anyway.
  /[\\/]zod[\\/]v4[\\/]classic[\\/]from-json-schema\.js$/,
  /[\\/]zod[\\/]v4[\\/]core[\\/]compile\.js$/,
  // Navigators with headers, tabs and cards: here a route is a page, drawn in a `Slot`.
  /[\\/]expo-router[\\/]build[\\/](stack[\\/]index|layouts[\\/]Tabs|layouts[\\/]experimental-stack[\\/]index(\.web)?)\.js$/,
  /[\\/]react-navigation[\\/](native-stack|bottom-tabs)[\\/]views[\\/]\w+\.js$/,
  /[\\/]expo-router[\\/]build[\\/]layouts[\\/]stack-utils[\\/]index\.js$/,
  /[\\/]expo-router[\\/]build[\\/]views[\\/]Sitemap\.js$/,
  // Lists that draw only what is in sight, which in a browser lose what is read aloud or searched for.
  /[\\/]react-native-web[\\/]dist[\\/]exports[\\/](FlatList|SectionList|VirtualizedList)[\\/]index\.js$/,
]

const resolveRequest = config.resolver.resolveRequest
config.resolver.resolveRequest = (context, moduleName, platform) => {
  const resolve = resolveRequest ?? context.resolveRequest
  const resolved = resolve(context, moduleName, platform)
  if (platform !== 'web' || resolved.type !== 'sourceFile') return resolved
  const file = path.normalize(resolved.filePath)
  return LEFT_OUT.some((part) => part.test(file)) ? { type: 'empty' } : resolved
}

module.exports = config

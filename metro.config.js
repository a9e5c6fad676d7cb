const path = require('node:path')
const { getDefaultConfig } = require('expo/metro-config')
const { isLeftOut } = require('./bundling/left-out')

const config = getDefaultConfig(__dirname)

const resolveRequest = config.resolver.resolveRequest
config.resolver.resolveRequest = (context, moduleName, platform) => {
  const resolve = resolveRequest ?? context.resolveRequest
  const resolved = resolve(context, moduleName, platform)
  if (platform !== 'web' || resolved.type !== 'sourceFile') return resolved
  return isLeftOut(resolved.filePath.split(path.sep).join('/')) ? { type: 'empty' } : resolved
}

module.exports = config

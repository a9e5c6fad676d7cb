const { createHash } = require('node:crypto')
const fs = require('node:fs')
const path = require('node:path')
const { getDefaultConfig } = require('expo/metro-config')
const { isLeftOut } = require('./bundling/left-out')
const { makeModulesBeforehand } = require('./bundling/made-beforehand')
const { shakePackages } = require('./bundling/shaken')

/** What files are turned into depends on these, which the bundler's cache does not know of. */
const hashOfPlugins = () =>
  ['babel.config.js', 'bundling/plain-rules.js']
    .reduce((hash, file) => hash.update(fs.readFileSync(path.join(__dirname, file))), createHash('sha256'))
    .digest('hex')

module.exports = async () => {
  const [shaken, made] = await Promise.all([shakePackages(), makeModulesBeforehand()])
  const config = getDefaultConfig(__dirname)
  config.cacheVersion = hashOfPlugins()
  const { resolveRequest } = config.resolver
  config.resolver.resolveRequest = (context, moduleName, platform) => {
    const resolve = resolveRequest ?? context.resolveRequest
    if (platform !== 'web') return resolve(context, moduleName, platform)
    const filePath = shaken.get(moduleName)
    if (filePath) return { type: 'sourceFile', filePath }
    const resolved = resolve(context, moduleName, platform)
    if (resolved.type !== 'sourceFile') return resolved
    const madeFilePath = made.get(resolved.filePath)
    if (madeFilePath) return { type: 'sourceFile', filePath: madeFilePath }
    return isLeftOut(resolved.filePath.split(path.sep).join('/')) ? { type: 'empty' } : resolved
  }
  return config
}

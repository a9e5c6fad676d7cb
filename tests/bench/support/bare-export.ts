import { execFile } from 'node:child_process'
import { mkdir, mkdtemp, rm, symlink, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { promisify } from 'node:util'

const run = promisify(execFile)

const INDEX = `import { Text } from 'react-native'

export default function Index() {
  return <Text>Bare</Text>
}
`

const metroConfig = (root: string): string => `const { getDefaultConfig } = require('expo/metro-config')

const config = getDefaultConfig(__dirname)
config.watchFolders = [${JSON.stringify(join(root, 'node_modules'))}]
config.resolver.nodeModulesPaths = [${JSON.stringify(join(root, 'node_modules'))}]
module.exports = config
`

/** A folder with an exported web app, and the way to remove it. */
export type ExportedApp = Readonly<{ folder: string; remove: () => Promise<void> }>

/** Exports the smallest Expo Router app there is, one word on one route, with the packages of the project at `root`. */
export async function exportBareApp(root: string): Promise<ExportedApp> {
  const home = await mkdtemp(join(tmpdir(), 'bicinium-bare-'))
  const remove = () => rm(home, { recursive: true, force: true })
  const web = { bundler: 'metro', output: 'single' }
  const expo = {
    name: 'Bare',
    slug: 'bare',
    scheme: 'bare',
    platforms: ['web'],
    web,
    plugins: ['expo-router'],
  }
  try {
    await mkdir(join(home, 'app'))
    await Promise.all([
      writeFile(join(home, 'package.json'), JSON.stringify({ name: 'bare', main: 'expo-router/entry' })),
      writeFile(join(home, 'app.json'), JSON.stringify({ expo })),
      writeFile(join(home, 'metro.config.js'), metroConfig(root)),
      writeFile(join(home, 'app', 'index.tsx'), INDEX),
      writeFile(join(home, 'babel.config.js'), `module.exports = { presets: ['babel-preset-expo'] }\n`),
      symlink(join(root, 'node_modules'), join(home, 'node_modules')),
    ])
    await run(join(root, 'node_modules/.bin/expo'), ['export', '-p', 'web', '--output-dir', 'dist'], {
      cwd: home,
      env: { ...process.env, CI: '1', EXPO_NO_TELEMETRY: '1' },
      maxBuffer: 16 * 1024 * 1024,
    })
    return { folder: join(home, 'dist'), remove }
  } catch (error) {
    await remove()
    throw error
  }
}

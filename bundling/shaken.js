/**
 * Packages in which the bundler cannot tell what is asked for: it takes modules whole, and what it does shake it keeps
 * for the sake of `import * as`. Each is made into one file of only what our own sources name, and read in its place by
 * browsers. The names are gathered from the sources, so that there is no list to keep up. The packages are unchanged.
 */
const fs = require('node:fs')
const path = require('node:path')
const esbuild = require('esbuild')
const { isLeftOut } = require('./left-out')
const { OUTPUT, ROOT, writeMade } = require('./made')

const SOURCES = ['app', 'components', 'shared']

/**
 * Packages to a file: those that share what lies under them, one copy of it. `isWhole`: our sources ask for members of the
 * package as a whole (`Y.Doc`), or of one export of it, `members` (`z.string`).
 */
const FILES = {
  zod: [{ name: 'zod', isWhole: true, members: 'z' }],
  live: [{ name: 'yjs', isWhole: true }, { name: 'y-websocket' }, { name: 'socket.io-client' }],
  svg: [{ name: 'react-native-svg' }],
}

const sourcesIn = (directory) =>
  fs.readdirSync(directory, { withFileTypes: true }).flatMap((entry) => {
    const file = path.join(directory, entry.name)
    if (entry.isDirectory()) return sourcesIn(file)
    return /\.tsx?$/.test(entry.name) ? [fs.readFileSync(file, 'utf8')] : []
  })

/** What our sources ask of a package: names of exports or members, and whether its default. */
function askedOf(sources, { name, members }) {
  const names = new Set()
  let hasDefault = false
  const from = new RegExp(`import (?:(\\w+)(?:, )?)?(?:\\* as (\\w+)|\\{([^}]*)\\})? from '${name}'`, 'g')
  for (const source of sources) {
    for (const [, one, star, list] of source.matchAll(from)) {
      if (one === 'type') continue
      hasDefault ||= one !== undefined
      const inList = (list ?? '').split(',').map((part) => part.trim().split(/\s+as\s+/)[0])
      const whole = star ?? (inList.includes(members) ? members : null)
      if (whole)
        for (const [, part] of source.matchAll(new RegExp(`\\b${whole}\\.(\\w+)`, 'g'))) names.add(part)
      else for (const part of inList) if (part && !part.startsWith('type ')) names.add(part)
    }
  }
  return { names: [...names].sort(), hasDefault }
}

function entryOf(sources, { name, members, isWhole }) {
  const asked = askedOf(sources, { name, members })
  if (!isWhole) {
    const names = [...(asked.hasDefault ? ['default'] : []), ...asked.names]
    return `export { ${names.join(', ')} } from '${name}'`
  }
  // Members of a namespace may be types, which are not there when it runs.
  const whole = members ? require(name)[members] : require(name)
  const names = asked.names.filter((part) => part in whole)
  if (!members) return `export { ${names.join(', ')} } from '${name}'`
  const imported = names.map((part) => `${part} as $${part}`).join(', ')
  const given = names.map((part) => `${part}: $${part}`).join(', ')
  return `import { ${imported} } from '${name}'\nexport const ${members} = { ${given} }`
}

const leftOut = {
  name: 'left-out',
  setup(build) {
    build.onLoad({ filter: /\.m?js$/ }, ({ path: file }) =>
      isLeftOut(file.split(path.sep).join('/')) ? { contents: 'module.exports = {}' } : null,
    )
  },
}

async function shake(file, packages, sources) {
  const outfile = path.join(OUTPUT, `${file}.js`)
  const { outputFiles } = await esbuild.build({
    stdin: { contents: packages.map((each) => entryOf(sources, each)).join('\n'), resolveDir: ROOT },
    outfile,
    bundle: true,
    write: false,
    format: 'esm',
    target: 'es2020',
    platform: 'browser',
    resolveExtensions: ['.web.js', '.mjs', '.js'],
    external: ['react', 'react/jsx-runtime', 'react-native'],
    plugins: [leftOut],
    // Their comments are said in the licences of the packages.
    legalComments: 'none',
    minifySyntax: true,
    define: { 'process.env.NODE_ENV': '"production"' },
  })
  writeMade(outfile, outputFiles[0].text)
}

/** Makes the files, and answers where a package's is: its name to a path. */
async function shakePackages() {
  const sources = SOURCES.flatMap((directory) => sourcesIn(path.join(ROOT, directory)))
  await Promise.all(Object.entries(FILES).map(([file, packages]) => shake(file, packages, sources)))
  return new Map(
    Object.entries(FILES).flatMap(([file, packages]) =>
      packages.map(({ name }) => [name, path.join(OUTPUT, `${file}.js`)]),
    ),
  )
}

module.exports = { shakePackages }

import { createHash } from 'node:crypto'
import {
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import path from 'node:path'
import { promisify } from 'node:util'
import { brotliCompress, constants, gzip } from 'node:zlib'
import { loadAhead } from './load-ahead.mjs'
import { runProgram } from './run-program.mjs'

const OUTPUT = 'dist/web'
/** Beside the output while a build is under way. */
const made = `${OUTPUT}-${process.pid}`
const old = `${OUTPUT}-old-${process.pid}`
const STAMP = path.join(OUTPUT, '.stamp')
/** What the web client is made of. */
const SOURCES = ['app', 'bundling', 'components', 'shared', 'fonts', 'public']
const FILES = ['app.json', 'babel.config.js', 'metro.config.js', 'package-lock.json', 'tsconfig.json']
const COMPRESSED = new Set(['.js', '.css', '.html', '.json', '.svg', '.txt'])
const LEAST_COMPRESSED_BYTES = 1024

const filesIn = (directory) =>
  existsSync(directory)
    ? readdirSync(directory, { withFileTypes: true }).flatMap((entry) => {
        const file = path.join(directory, entry.name)
        return entry.isDirectory() ? filesIn(file) : [file]
      })
    : []

function hashSources() {
  const hash = createHash('sha256')
  for (const file of [...SOURCES.flatMap(filesIn), ...FILES.filter(existsSync)].sort()) {
    hash.update(file).update('\0').update(readFileSync(file)).update('\0')
  }
  return hash.digest('hex')
}

/** Whether what is built is of these very sources. */
export function isWebCurrent() {
  try {
    return existsSync(path.join(OUTPUT, 'index.html')) && readFileSync(STAMP, 'utf8') === hashSources()
  } catch {
    return false
  }
}

export function removeHalfBuilt() {
  for (const directory of [made, old]) rmSync(directory, { recursive: true, force: true })
}

const brotli = promisify(brotliCompress)
const zip = promisify(gzip)

/** Compresses once, as well as it can be done, what would else be compressed at every request. */
async function compressAll(directory) {
  for (const file of filesIn(directory)) {
    if (!COMPRESSED.has(path.extname(file)) || statSync(file).size < LEAST_COMPRESSED_BYTES) continue
    const bytes = readFileSync(file)
    const [br, gz] = await Promise.all([
      brotli(bytes, { params: { [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length } }),
      zip(bytes, { level: 9 }),
    ])
    writeFileSync(`${file}.br`, br)
    writeFileSync(`${file}.gz`, gz)
  }
}

/** Builds the web client beside the old one and puts it in its place when it is whole. */
export async function buildWeb() {
  const stamp = hashSources()
  mkdirSync(path.dirname(OUTPUT), { recursive: true })
  try {
    await runProgram(path.resolve('node_modules/.bin/expo'), ['export', '-p', 'web', '--output-dir', made], {
      env: { CI: '1', EXPO_NO_TELEMETRY: '1', NODE_ENV: 'production' },
    })
    loadAhead(made)
    await compressAll(made)
    writeFileSync(path.join(made, '.stamp'), stamp)
    if (existsSync(OUTPUT)) renameSync(OUTPUT, old)
    renameSync(made, OUTPUT)
  } finally {
    removeHalfBuilt()
  }
}

import { existsSync, readdirSync } from 'node:fs'
import path from 'node:path'
import { runProgram } from './run-program.mjs'
import { SetUpError } from './steps.mjs'

const SERVER_ROOTS = '/usr/lib/postgresql'
const ON_PATH = (process.env.PATH ?? '').split(path.delimiter)
const isOnPath = (name) => ON_PATH.some((directory) => existsSync(path.join(directory, name)))

const hasPostgres = () =>
  isOnPath('initdb') ||
  (existsSync(SERVER_ROOTS) &&
    readdirSync(SERVER_ROOTS).some((major) => existsSync(path.join(SERVER_ROOTS, major, 'bin', 'initdb'))))

const hasChromium = () => ['chromium', 'chromium-browser', 'google-chrome'].some(isOnPath)

/** The packages of the system that are missing, by their Debian names. */
export const missingPackages = async ({ needsBrowser }) => [
  ...(process.env.DATABASE_URL || hasPostgres() ? [] : ['postgresql']),
  ...(!needsBrowser || hasChromium() ? [] : ['chromium']),
  ...(await missingForTests({ needsBrowser })),
]

/** What tests can do without, and compare more with: the answer-set solver. Not asked for where we may not install it. */
const missingForTests = async ({ needsBrowser }) =>
  needsBrowser && !isOnPath('clingo') && (await installerPrefix()) !== null ? ['gringo'] : []

/** How to install: as root, by sudo that asks for no password, or not at all. */
async function installerPrefix() {
  if (!isOnPath('apt-get')) return null
  if (process.getuid?.() === 0) return []
  if (!isOnPath('sudo')) return null
  return runProgram('sudo', ['-n', 'true']).then(
    () => ['sudo', '-n'],
    () => null,
  )
}

/** Installs what is missing where we may, and else says the one line to run. */
export async function installPackages(packages, say) {
  const prefix = await installerPrefix()
  const line = `apt-get update && apt-get install -y ${packages.join(' ')}`
  if (prefix === null) {
    throw new SetUpError(
      `Missing on this machine: ${packages.join(', ')}. As root, run:\n\n    ${line}\n\nand start again.`,
    )
  }
  // RUNLEVEL=1: Debian's own cluster is not started; ours is another, under .data.
  const apt = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', 'RUNLEVEL=1', 'apt-get', '-q']
  const run = (args) => runProgram(apt[0], [...apt.slice(1), ...args])
  say(`installing ${packages.join(', ')}`)
  try {
    await run(['update'])
    await run(['install', '-y', '--no-install-recommends', ...packages])
  } catch (error) {
    throw new SetUpError(`${error.message}\n\nInstalling by hand may tell more:\n\n    ${line}`)
  }
}

import { readFileSync } from 'node:fs'
import { runProgram } from './run-program.mjs'

const LOCK = 'package-lock.json'
/** npm's own record of what it put into node_modules. */
const INSTALLED = 'node_modules/.package-lock.json'

const packagesIn = (file) => {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages
  } catch {
    return {}
  }
}

/** Whether every package of the lock file is installed in the version it names. */
export function arePackagesCurrent() {
  const installed = packagesIn(INSTALLED)
  return Object.entries(packagesIn(LOCK)).every(
    ([name, { version, optional, link }]) =>
      name === '' || optional || link || installed[name]?.version === version,
  )
}

export async function installNodePackages(say) {
  say('npm ci (some hundred megabytes the first time)')
  await runProgram('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'])
}

import { statfsSync } from 'node:fs'
import { arePackagesCurrent, installNodePackages } from './node-packages.mjs'
import { stopPrograms } from './run-program.mjs'
import { SetUpError, step } from './steps.mjs'
import { installPackages, missingPackages } from './system-packages.mjs'
import { buildWeb, isWebCurrent, removeHalfBuilt } from './web-build.mjs'

const SIGNALS = ['SIGINT', 'SIGTERM', 'SIGHUP']
const MEGABYTE = 1024 * 1024
/** Room the packages, the build and an empty cluster take. */
const INSTALL_MEGABYTES = 1_500
const RUN_MEGABYTES = 100

function checkRoom(megabytes) {
  const { bavail, bsize } = statfsSync('.')
  const free = Math.floor((bavail * bsize) / MEGABYTE)
  if (free < megabytes) {
    throw new SetUpError(
      `The disk that holds ${process.cwd()} is nearly full: ${free} MB are free, ${megabytes} MB are needed. Make room and start again.`,
    )
  }
}

/** Until the server runs there is nothing to wind up but the program that is at work. */
function stopOnSignals() {
  const stop = () => {
    stopPrograms()
    removeHalfBuilt()
    process.exit(130)
  }
  for (const signal of SIGNALS) process.once(signal, stop)
  return () => SIGNALS.forEach((signal) => process.off(signal, stop))
}

/** Installs what is missing and builds what is stale, telling each step. */
export async function setUp({ needsBrowser }) {
  const letGo = stopOnSignals()
  const isCurrent = arePackagesCurrent()
  checkRoom(isCurrent ? RUN_MEGABYTES : INSTALL_MEGABYTES)
  const missing = await missingPackages({ needsBrowser })
  if (missing.length > 0) await step('System packages', (say) => installPackages(missing, say))
  if (!isCurrent) await step('Node packages', installNodePackages)
  if (!isWebCurrent()) await step('Web client (built once, about a minute)', buildWeb)
  letGo()
}

/** Ends with words for an expected failure, and with all there is for another. */
export function giveUp(error) {
  const isExpected = error instanceof SetUpError || error?.code === 'ENOSPC'
  console.error(isExpected ? `\n${error.message}\n` : error)
  process.exit(1)
}

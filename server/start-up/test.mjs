// `npm test`: sets up as `npm start` does, then checks everything CI checks and runs every test. Arguments go to jest and
// leave the checks out: `npm test -- --selectProjects unit`.
import { checkNode } from './check-node.mjs'

checkNode()

const STOP_SIGNALS = ['SIGINT', 'SIGTERM', 'SIGHUP']

/** Runs a program with its output shown, to its end. */
async function show(command, args, env = {}) {
  const { spawn } = await import('node:child_process')
  return new Promise((resolve) => {
    const child = spawn(command, args, { stdio: 'inherit', env: { ...process.env, ...env } })
    // A terminal tells both of us to stop; whoever tells only us means the program as well.
    const stop = () => {
      child.kill('SIGINT')
      process.exitCode = 130
    }
    for (const signal of STOP_SIGNALS) process.once(signal, stop)
    const end = (exitCode) => {
      for (const signal of STOP_SIGNALS) process.off(signal, stop)
      resolve(exitCode)
    }
    child.on('error', () => end(1))
    child.on('close', (exitCode) => end(exitCode ?? 1))
  })
}

/** What jest counted; a file that could not even be run counts as one failure, no report at all as one too. */
function countOf(file, readFileSync, exitCode) {
  try {
    const report = JSON.parse(readFileSync(file, 'utf8'))
    const failed = report.numFailedTests + report.numRuntimeErrorTestSuites
    return { passed: report.numPassedTests, failed: failed === 0 && exitCode !== 0 ? 1 : failed }
  } catch {
    return { passed: 0, failed: 1 }
  }
}

async function test() {
  const { fileURLToPath } = await import('node:url')
  process.chdir(fileURLToPath(new URL('../..', import.meta.url)))
  const { mkdirSync, readFileSync, rmSync } = await import('node:fs')
  const { setUp, giveUp } = await import('./set-up.mjs')
  const { step } = await import('./steps.mjs')
  console.log('Bicinium, tests')
  await setUp({ needsBrowser: true }).catch(giveUp)

  const given = process.argv.slice(2)
  let passed = 0
  let failed = 0
  if (given.length === 0) {
    for (const [label, script] of [
      ['Format', 'format:check'],
      ['Lint', 'lint'],
      ['Types', 'types'],
    ]) {
      const isGood = await step(label, (say) => {
        say(`npm run ${script}`)
        return show('npm', ['run', '-s', script]).then((exitCode) => exitCode === 0)
      })
      if (isGood) passed += 1
      else failed += 1
      if (!isGood) console.log(`  ${label}: there is something to mend, see above`)
    }
  }

  const report = `.data/jest-${process.pid}.json`
  mkdirSync('.data', { recursive: true })
  const jest = ['node_modules/jest/bin/jest.js', '--ci', '--json', `--outputFile=${report}`, ...given]
  const exitCode = await show(process.execPath, jest, { NODE_ENV: 'test' })
  const counted = countOf(report, readFileSync, exitCode)
  rmSync(report, { force: true })
  passed += counted.passed
  failed += counted.failed
  console.log(`${passed} passed, ${failed} failed`)
  process.exit(failed === 0 ? 0 : 1)
}

test()

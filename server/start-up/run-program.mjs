import { spawn } from 'node:child_process'
import { SetUpError } from './steps.mjs'

const TOLD_LINES = 25
const DISK_FULL = /ENOSPC|No space left on device/i

const running = new Set()

/** Ends the programs that are running now: we were told to stop. */
export function stopPrograms() {
  for (const child of running) child.kill('SIGTERM')
}

/** Runs a program to its end. Its output is kept back and shown only when it fails. */
export function runProgram(command, args, { env = {}, cwd = process.cwd() } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd,
      env: { ...process.env, ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    running.add(child)
    let output = ''
    const keep = (chunk) => (output = (output + chunk).slice(-100_000))
    child.stdout.on('data', keep)
    child.stderr.on('data', keep)
    child.on('error', (error) => reject(new SetUpError(`${command} cannot be run: ${error.message}`)))
    child.on('close', (exitCode, signal) => {
      running.delete(child)
      if (exitCode === 0) resolve(output)
      else if (DISK_FULL.test(output))
        reject(new SetUpError(`The disk that holds ${cwd} is full. Make room and start again.`))
      else {
        const lines = output.trim().split('\n').slice(-TOLD_LINES).join('\n')
        reject(new SetUpError(`${[command, ...args].join(' ')} ended with ${signal ?? exitCode}:\n${lines}`))
      }
    })
  })
}

// `npm start`: installs what is missing, builds what is stale, and serves. Plain Node, for there may be nothing else yet.
import { checkNode } from './check-node.mjs'

checkNode()

async function start() {
  const { chdir } = await import('node:process')
  const { fileURLToPath } = await import('node:url')
  chdir(fileURLToPath(new URL('../..', import.meta.url)))
  const { setUp, giveUp } = await import('./set-up.mjs')
  console.log('Bicinium')
  await setUp({ needsBrowser: false }).catch(giveUp)

  const { spawn } = await import('node:child_process')
  const server = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], { stdio: 'inherit' })
  // The server stops what it started; we wait for it. Ctrl-C reaches it by itself, other senders only us.
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => server.kill('SIGTERM'))
  server.on('exit', (exitCode) => process.exit(exitCode ?? 1))
}

start()

import { spawn, type SpawnOptions } from 'node:child_process'
import type { ServerUser } from './server-user'

export type CommandOutcome = Readonly<{ exitCode: number; output: string }>

/**
 * Runs a program of the server's to its end, as the server's user. Its messages are asked for in English, for we read
 * them. `detachOutput` is for a program that leaves a server behind, which would hold our pipes open for ever.
 */
export function runCommand(
  command: string,
  args: readonly string[],
  { user, detachOutput = false }: { user: ServerUser | null; detachOutput?: boolean },
): Promise<CommandOutcome> {
  return new Promise((resolve, reject) => {
    const streams = detachOutput ? 'ignore' : 'pipe'
    const options: SpawnOptions = {
      cwd: '/',
      // Its own small environment: our secrets are not its business.
      env: { PATH: process.env.PATH, LC_ALL: 'C', TZ: 'UTC' } as unknown as NodeJS.ProcessEnv,
      stdio: ['ignore', streams, streams],
      ...(user && { uid: user.uid, gid: user.gid }),
    }
    const child = spawn(command, args, options)
    let output = ''
    for (const stream of [child.stdout, child.stderr]) {
      stream?.on('data', (chunk: Buffer) => (output += chunk.toString()))
    }
    child.on('error', reject)
    child.on('close', (exitCode) => resolve({ exitCode: exitCode ?? 1, output }))
  })
}

import { fork, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import path from 'node:path'
import { findFreePort } from '@/db/cluster/find-free-port'

/** A server process on one address, killed without warning and started again. */
export class KillableServer {
  #child: ChildProcess | null = null

  private constructor(
    readonly origin: string,
    readonly port: number,
    readonly databaseUrl: string,
  ) {}

  static async start(databaseUrl: string): Promise<KillableServer> {
    const port = await findFreePort(0)
    const server = new KillableServer(`http://127.0.0.1:${port}`, port, databaseUrl)
    await server.restart()
    return server
  }

  async restart(): Promise<void> {
    const child = fork(path.resolve('tests/realtime/support/server-child.ts'), {
      execArgv: ['--import', 'tsx'],
      env: { ...process.env, CHILD_DATABASE_URL: this.databaseUrl, CHILD_PORT: String(this.port) },
      stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    })
    this.#child = child
    await once(child, 'message')
  }

  /** SIGKILL: nothing of the process is asked or told. */
  async kill(): Promise<void> {
    const child = this.#child
    this.#child = null
    if (!child || child.exitCode !== null || child.signalCode !== null) return
    const exited = once(child, 'exit')
    child.kill('SIGKILL')
    await exited
  }
}

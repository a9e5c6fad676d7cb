import { fork, type ChildProcess } from 'node:child_process'
import path from 'node:path'

type Question = 'cpu' | 'memory'

export const isQuestion = (message: unknown, question: Question): boolean =>
  (message as { question?: unknown } | null)?.question === question

export type MeasuredProcess = Readonly<{
  origin: string
  /** Processor time used since its start. */
  cpuMs: () => Promise<number>
  /** Resident memory after collecting. */
  memoryBytes: () => Promise<number>
  stop: () => Promise<void>
}>

const nextAnswer = (child: ChildProcess, kind: string): Promise<number> =>
  new Promise((resolve, reject) => {
    const onExit = (code: number | null) => reject(new Error(`The measured process ended with ${code}`))
    const onMessage = (message: unknown) => {
      const answer = message as { kind: string; value: number }
      if (answer.kind !== kind) return
      child.off('message', onMessage)
      child.off('exit', onExit)
      resolve(answer.value)
    }
    child.on('message', onMessage)
    child.once('exit', onExit)
  })

/** Starts the process that is measured: our server on a database, or the bare relay. */
export async function startMeasured(databaseUrl: string | null): Promise<MeasuredProcess> {
  const file = databaseUrl ? 'server-process.ts' : 'relay-process.mjs'
  const child = fork(path.resolve('tests/bench/lesson', file), {
    execArgv: databaseUrl ? ['--expose-gc', '--import', 'tsx'] : [],
    env: { ...process.env, ...(databaseUrl && { BENCH_DATABASE_URL: databaseUrl }) },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  })
  const port = await nextAnswer(child, 'ready')
  const ask = (question: Question): Promise<number> => {
    const answer = nextAnswer(child, question)
    child.send({ question })
    return answer
  }
  return {
    origin: `http://127.0.0.1:${port}`,
    cpuMs: () => ask('cpu'),
    memoryBytes: () => ask('memory'),
    stop: () =>
      new Promise((resolve) => {
        child.once('exit', () => resolve())
        child.disconnect()
      }),
  }
}

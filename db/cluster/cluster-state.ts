import { randomBytes } from 'node:crypto'
import { readFileSync, renameSync, writeFileSync } from 'node:fs'
import { z } from 'zod'

const stateSchema = z.object({
  port: z.int().min(0).max(65_535),
  password: z.string().min(16),
  /** Processes that use the cluster: the last of them to go stops it. */
  keepers: z.array(z.int()).default([]),
})

/** What is remembered of a cluster between runs, in a file that only its owner can read. */
export type ClusterState = z.infer<typeof stateSchema>

export function readClusterState(file: string): ClusterState | null {
  try {
    return stateSchema.parse(JSON.parse(readFileSync(file, 'utf8')))
  } catch {
    return null
  }
}

export const createClusterState = (): ClusterState => ({
  port: 0,
  password: randomBytes(24).toString('hex'),
  keepers: [],
})

/** Written beside and renamed, so that a run cut short leaves the old state or the new one. */
export function writeClusterState(file: string, state: ClusterState): void {
  const written = `${file}.${process.pid}`
  writeFileSync(written, `${JSON.stringify(state, null, 2)}\n`, { mode: 0o600 })
  renameSync(written, file)
}

/** What can keep a cluster from coming up, each with what to do about it in its message. */
export type ClusterErrorCode =
  | 'no-server'
  | 'no-user'
  | 'stale-cluster'
  | 'disk-full'
  | 'busy'
  | 'locked'
  | 'initdb-failed'
  | 'start-failed'

export class ClusterError extends Error {
  override readonly name = 'ClusterError'

  constructor(
    readonly code: ClusterErrorCode,
    message: string,
  ) {
    super(message)
  }
}

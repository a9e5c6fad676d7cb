// Relative, for jest's global set-up knows no alias.
import path from 'node:path'
import { startCluster, type Cluster } from '../../db/cluster/start-cluster'

export const TEST_SERVER_VARIABLE = 'TEST_DATABASE_SERVER'

/** The cluster tests make their databases on: apart from the one that `npm start` uses, and quicker than safe. */
export const startTestCluster = (): Promise<Cluster> =>
  startCluster(path.resolve('.data/test-postgres'), { isForgetful: true })

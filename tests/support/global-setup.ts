import { startTestCluster, TEST_SERVER_VARIABLE } from './test-cluster'

/** Once a jest run: the cluster is up, its address is in the environment that workers inherit. */
// eslint-disable-next-line import-x/no-default-export -- jest asks for it
export default async function setUp(): Promise<void> {
  if (process.env[TEST_SERVER_VARIABLE]) return
  const cluster = await startTestCluster()
  process.env[TEST_SERVER_VARIABLE] = cluster.urlOf('postgres')
  ;(globalThis as { releaseTestCluster?: () => Promise<void> }).releaseTestCluster = cluster.release
}

import { startTestCluster, TEST_SERVER_VARIABLE } from './test-cluster'

/** Runs `work` with the tests' cluster up, for programs that jest does not run: benches and the tour. */
export async function withTestCluster<Value>(work: () => Promise<Value>): Promise<Value> {
  if (process.env[TEST_SERVER_VARIABLE]) return work()
  const cluster = await startTestCluster()
  process.env[TEST_SERVER_VARIABLE] = cluster.urlOf('postgres')
  try {
    return await work()
  } finally {
    delete process.env[TEST_SERVER_VARIABLE]
    await cluster.release()
  }
}

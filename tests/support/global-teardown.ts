// eslint-disable-next-line import-x/no-default-export -- jest asks for it
export default async function tearDown(): Promise<void> {
  const holder = globalThis as { releaseTestCluster?: () => Promise<void> }
  await holder.releaseTestCluster?.()
  delete holder.releaseTestCluster
}

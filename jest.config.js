const transform = {
  '^.+\\.(t|j|mj|cj)sx?$': [
    '@swc/jest',
    {
      jsc: {
        parser: { syntax: 'typescript', tsx: true },
        target: 'es2022',
        transform: { react: { runtime: 'automatic' } },
      },
      module: { type: 'commonjs' },
    },
  ],
}

/** One project a kind of test, so that `npx jest --selectProjects unit` runs only the quick ones. */
const project = (displayName, more = {}) => ({
  displayName,
  rootDir: __dirname,
  testMatch: [`<rootDir>/tests/${displayName}/**/*.test.ts?(x)`],
  testEnvironment: 'node',
  moduleNameMapper: { '^@/(.*)$': '<rootDir>/$1' },
  transform,
  transformIgnorePatterns: [
    '/node_modules/(?!(better-auth|@better-auth|better-call|@better-fetch|jose|nanostores|@noble|rou3|defu|uncrypto|set-cookie-parser)/)',
  ],
  ...more,
})

/** These make databases of their own on a cluster that one set-up brings up. */
const withDatabase = {
  globalSetup: '<rootDir>/tests/support/global-setup.ts',
  setupFilesAfterEnv: ['<rootDir>/tests/support/patience.ts'],
  globalTeardown: '<rootDir>/tests/support/global-teardown.ts',
}

module.exports = {
  // Browser tests mostly wait: a worker for every core keeps the machine busy.
  maxWorkers: '100%',
  projects: [
    project('unit'),
    project('api', withDatabase),
    project('realtime', withDatabase),
    project('browser', withDatabase),
  ],
}

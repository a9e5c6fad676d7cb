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

module.exports = {
  projects: [project('unit'), project('api'), project('realtime'), project('browser')],
}

const swc = {
  jsc: {
    parser: { syntax: 'typescript', decorators: true },
    transform: { legacyDecorator: true, decoratorMetadata: true, verbatimModuleSyntax: true },
    target: 'es2023',
    keepClassNames: true,
    experimental: { keepImportAttributes: true },
  },
  module: { type: 'es6' },
  sourceMaps: 'inline',
};
export default {
  rootDir: '..',
  testMatch: ['<rootDir>/test/**/*.test.ts'],
  transform: { '^.+\\.ts$': ['@swc/jest', swc] },
  extensionsToTreatAsEsm: ['.ts'],
  globalSetup: '<rootDir>/test/support/global-setup.ts',
  globalTeardown: '<rootDir>/test/support/global-teardown.ts',
  reporters: ['default', '<rootDir>/.config/jest-last-line.mjs'],
  testTimeout: 60_000,
  // One more than two cores: files that wait for processes, heartbeats and locks leave time to the others.
  maxWorkers: 3,
  testEnvironment: '<rootDir>/.config/jest-environment.mjs',
  testSequencer: '<rootDir>/.config/jest-long-first.mjs',
  workerIdleMemoryLimit: '1200MB',
};

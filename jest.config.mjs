/** Two projects: everything that runs on Node (server), and the dashboard under jsdom (client). */
const conditions = ['underseam-source'];
const testing = '<rootDir>/projects/dashboard/src/app/testing';

export default {
  // Both cores; a worker that has grown is begun anew before it slows down.
  maxWorkers: 2,
  workerIdleMemoryLimit: '1500MB',
  // Real servers are started in hooks, and two of them may share a core.
  testTimeout: 30_000,
  projects: [
    {
      displayName: 'server',
      testEnvironment: 'node',
      testEnvironmentOptions: { customExportConditions: [...conditions, 'node', 'node-addons'] },
      roots: [
        '<rootDir>/shared',
        '<rootDir>/db',
        '<rootDir>/server',
        '<rootDir>/seeds',
        '<rootDir>/test',
      ],
      testMatch: ['**/*.spec.ts'],
      testPathIgnorePatterns: ['/test/journeys/'],
      transform: {
        '^.+\\.ts$': ['@swc/jest', { jsc: { target: 'es2022', parser: { syntax: 'typescript' } } }],
      },
    },
    {
      displayName: 'client',
      preset: 'jest-preset-angular',
      roots: ['<rootDir>/projects/dashboard/src'],
      testEnvironmentOptions: { customExportConditions: [...conditions, 'browser'] },
      // Angular is set up by whoever imports it (testing/angular-testing.cjs), not for every file.
      moduleNameMapper: {
        '^@angular/core$': `${testing}/angular-core.cjs`,
        '^@angular/core/testing$': `${testing}/angular-testing.cjs`,
        '^angular-core-itself$': '<rootDir>/node_modules/@angular/core/fesm2022/core.mjs',
        '^angular-testing-itself$': '<rootDir>/node_modules/@angular/core/fesm2022/testing.mjs',
      },
      setupFilesAfterEnv: [`${testing}/setup.ts`],
      transform: {
        '^.+\\.(ts|mjs|js|html|svg)$': [
          'jest-preset-angular',
          {
            tsconfig: '<rootDir>/projects/dashboard/tsconfig.spec.json',
            stringifyContentPathRegex: '\\.(html|svg)$',
          },
        ],
      },
      transformIgnorePatterns: ['node_modules/(?!(.*\\.mjs$|@angular|d3-|internmap))'],
    },
  ],
};

/**
 * Unit, contract and database tests. Database specs (`*.db.spec.ts`) read the server's address from
 * the WINDCHEST_TEST_DB_* variables that `npm test` sets; each worker makes a database of its own.
 */
const common = {
  extensionsToTreatAsEsm: ['.ts', '.tsx'],
  moduleNameMapper: {
    '^@windchest/fake-(stripe|mail)$': '<rootDir>/fakes/$1/src/index.ts',
    '^@windchest/seed-data$': '<rootDir>/seed-data/src/index.ts',
    '^@windchest/([a-z]+)$': '<rootDir>/packages/$1/src/index.ts',
    '^(\\.{1,2}/.*)\\.js$': '$1',
  },
  transform: {
    '^.+\\.tsx?$': [
      '@swc/jest',
      {
        jsc: {
          target: 'es2022',
          parser: { syntax: 'typescript', decorators: true, tsx: false },
          transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
        },
        module: { type: 'es6' },
      },
    ],
  },
  testEnvironment: 'node',
  modulePathIgnorePatterns: ['/dist/', '/.windchest/'],
};

export default {
  projects: [
    {
      ...common,
      displayName: 'unit',
      testMatch: ['<rootDir>/{packages,apps,fakes,seed-data}/**/*.spec.ts'],
      testPathIgnorePatterns: ['/node_modules/', '\\.db\\.spec\\.ts$'],
      setupFiles: ['reflect-metadata'],
    },
    {
      ...common,
      displayName: 'database',
      testMatch: ['<rootDir>/apps/api/**/*.db.spec.ts'],
      setupFiles: ['reflect-metadata'],
    },
  ],
  testTimeout: 60000,
};

// Jest projects of the workspaces: one place for the transform, the source condition and the database set-up.
const { join } = require('node:path');

const tsJest = (tsconfig) => ({ '^.+\\.tsx?$': ['ts-jest', { tsconfig, diagnostics: false }] });

function nodeProject(displayName, rootDir, extra = {}) {
  return {
    displayName,
    rootDir,
    testEnvironment: 'node',
    testMatch: ['<rootDir>/**/*.spec.ts', '<rootDir>/**/*.int-spec.ts', '<rootDir>/**/*.e2e-spec.ts'],
    testPathIgnorePatterns: ['/node_modules/', '/dist/'],
    modulePathIgnorePatterns: ['<rootDir>/dist/'],
    testEnvironmentOptions: { customExportConditions: ['@proofplate/source', 'node', 'require', 'default'] },
    transform: tsJest(join(rootDir, 'tsconfig.json')),
    setupFilesAfterEnv: [join(__dirname, 'each-test-file.cjs')],
    ...extra,
  };
}

/** Tests that need PostgreSQL: a throw-away cluster with one migrated template, cloned by each test file. */
function databaseProject(displayName, rootDir, extra = {}) {
  return nodeProject(displayName, rootDir, {
    globalSetup: join(__dirname, 'postgres-setup.mjs'),
    globalTeardown: join(__dirname, 'postgres-teardown.mjs'),
    ...extra,
  });
}

module.exports = { nodeProject, databaseProject, tsJest };

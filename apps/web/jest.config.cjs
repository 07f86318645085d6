const { tsJest } = require('../cli/jest/projects.cjs');

module.exports = {
  displayName: 'web',
  rootDir: __dirname,
  testEnvironment: '<rootDir>/src/testing/environment.cjs',
  testMatch: ['<rootDir>/src/**/*.spec.{ts,tsx}'],
  testEnvironmentOptions: { customExportConditions: ['@proofplate/source', 'browser', 'require', 'default'] },
  transform: tsJest('<rootDir>/tsconfig.jest.json'),
  setupFiles: ['<rootDir>/src/testing/polyfills.cjs'],
  setupFilesAfterEnv: ['<rootDir>/src/testing/setup.cjs'],
  moduleNameMapper: { '\\.css$': '<rootDir>/src/testing/style-stub.cjs' },
};

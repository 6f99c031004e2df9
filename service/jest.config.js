// Worker processes inherit it: they share the invented scenario that the first of them makes.
process.env.SILTLIGHT_TEST_RUN ??= String(process.pid);

/** @type {import('jest').Config} */
module.exports = {
  testEnvironment: 'node',
  testEnvironmentOptions: { customExportConditions: ['source', 'node', 'node-addons', 'require', 'default'] },
  testMatch: ['<rootDir>/{src,test}/**/*.{spec,e2e-spec}.ts'],
  // Migrations, argon2 and spawned readers make a first request slower than jest's five seconds on a busy machine.
  testTimeout: 60000,
  globalTeardown: '<rootDir>/test/support/remove-seeded-data.ts',
  maxWorkers: 2,
  transform: {
    '^.+\\.ts$': [
      '@swc/jest',
      {
        jsc: {
          target: 'es2022',
          parser: { syntax: 'typescript', decorators: true },
          transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
          keepClassNames: true,
        },
        module: { type: 'commonjs' },
        sourceMaps: 'inline',
      },
    ],
  },
};

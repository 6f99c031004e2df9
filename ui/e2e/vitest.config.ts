import { defineConfig } from 'vitest/config';

/** Browser walks over the built product. One file at a time: each starts a server of its own. */
export default defineConfig({
  test: {
    include: ['e2e/**/*.walk.ts'],
    environment: 'node',
    globalSetup: ['e2e/seed.ts'],
    fileParallelism: false,
    testTimeout: 180_000,
    hookTimeout: 180_000,
  },
});

import { defineConfig } from 'vitest/config';

/** Browser walks over the built product. One file at a time: each starts a server of its own. */
export default defineConfig({
  test: {
    include: ['e2e/**/*.walk.ts'],
    environment: 'node',
    globalSetup: ['e2e/seed.ts'],
    fileParallelism: false,
    testTimeout: 600_000, // one page after another, on machines that do other work as well
    hookTimeout: 300_000,
  },
});

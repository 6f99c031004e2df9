import { defineConfig } from 'vitest/config';

/** `npx vitest run --config e2e/screens.config.ts` writes pictures of every page to e2e/output. */
export default defineConfig({
  test: {
    include: ['e2e/screens.look.ts'],
    environment: 'node',
    globalSetup: ['e2e/seed.ts'],
    testTimeout: 900_000,
  },
});

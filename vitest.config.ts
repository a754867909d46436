import { defineConfig } from 'vitest/config';

/** Both need PostgreSQL; see packages/api/src/testing. */
const globalSetup = ['packages/api/src/testing/global-setup.ts'];

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: [
            'packages/shared/src/**/*.test.ts',
            'packages/web/src/**/*.test.{ts,tsx}',
            'packages/api/bin/lib/*.test.mjs',
            'seed/**/*.test.ts',
          ],
          setupFiles: ['packages/shared/src/testing/same-draws.setup.ts'],
          testTimeout: 20_000,
        },
      },
      {
        test: {
          name: 'api',
          include: ['packages/api/src/**/*.test.ts'],
          pool: 'forks',
          globalSetup,
          setupFiles: ['packages/api/src/testing/database.setup.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'browser',
          include: ['packages/web/e2e/**/*.e2e.ts'],
          pool: 'forks',
          globalSetup,
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
});

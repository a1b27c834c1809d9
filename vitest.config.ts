import { defineConfig } from 'vitest/config';

/** Two workers: the machines that run this have two cores. */
const MAX_WORKERS = 2;

export default defineConfig({
  resolve: { tsconfigPaths: true },
  test: {
    maxWorkers: MAX_WORKERS,
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['app/**/*.test.{ts,tsx}', 'bench/**/*.test.ts'],
          exclude: ['**/*.integration.test.ts'],
          setupFiles: ['tests/setup/console.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          include: ['tests/**/*.test.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          globalSetup: ['tests/setup/global.ts'],
          setupFiles: ['tests/setup/console.ts', 'tests/setup/database.ts'],
        },
      },
    ],
  },
});

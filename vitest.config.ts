import { defineConfig } from 'vitest/config';

export default defineConfig({
  resolve: { tsconfigPaths: true },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['app/**/*.test.{ts,tsx}', 'bench/**/*.test.ts'],
          exclude: ['**/*.integration.test.ts'],
        },
      },
      {
        extends: true,
        test: { name: 'integration', include: ['tests/**/*.test.ts'], testTimeout: 30_000 },
      },
    ],
  },
});

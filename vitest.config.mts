import { defineConfig } from 'vitest/config';

export default defineConfig({
  resolve: { tsconfigPaths: true },
  test: {
    environment: 'node',
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: [
            'tests/*.test.ts',
            'tests/shared/**/*.test.ts',
            'tests/components/**/*.test.ts',
            'tests/features/**/*.test.ts',
            'tests/server/**/*.test.ts',
          ],
          testTimeout: 30_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'journeys',
          include: ['tests/journeys/**/*.test.ts'],
          testTimeout: 180_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
    coverage: { provider: 'v8', include: ['shared/**/*.ts', 'server/**/*.ts'], reporter: ['text-summary'] },
  },
});

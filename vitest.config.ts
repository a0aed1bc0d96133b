// Two projects: unit (pure, in Node) and browser (the built sheet in Chromium).
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: [
            'packages/*/test/**/*.test.{ts,tsx}',
            'apps/cli/test/**/*.test.ts',
            'apps/report/test/unit/**/*.test.{ts,tsx}',
          ],
          environment: 'node',
          testTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'browser',
          include: ['apps/report/test/**/*.test.ts', 'apps/cli/test-e2e/**/*.test.ts'],
          exclude: ['**/node_modules/**', 'apps/report/test/unit/**'],
          environment: 'node',
          testTimeout: 120_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
    ],
  },
});

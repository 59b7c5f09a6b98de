import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'core',
          environment: 'node',
          include: ['tests/core/**/*.test.ts', 'tests/published/**/*.test.ts', 'tests/property/**/*.test.ts'],
          pool: 'threads',
          isolate: false,
          deps: { optimizer: { ssr: { enabled: true, include: ['mathjs'] } } },
        },
      },
      {
        test: {
          name: 'house',
          environment: 'node',
          include: ['tests/house/**/*.test.ts'],
          testTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'cli',
          environment: 'node',
          include: ['tests/cli/**/*.test.ts'],
          testTimeout: 30_000,
        },
      },
      {
        test: {
          name: 'api',
          environment: 'node',
          include: ['tests/api/**/*.test.ts'],
          pool: 'forks',
          hookTimeout: 60_000,
          testTimeout: 30_000,
        },
      },
      {
        extends: './vite.config.ts',
        root: '.',
        test: { name: 'web', environment: 'jsdom', include: ['tests/web/**/*.test.{ts,tsx}'] },
      },
      {
        test: {
          name: 'browser',
          environment: 'node',
          include: ['tests/browser/**/*.test.ts'],
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});

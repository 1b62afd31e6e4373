import { defineConfig } from 'vitest/config';

// Two projects: `unit` needs nothing but Node, `api` needs DATABASE_URL (npm test provides a throw-away cluster).
export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          include: ['shared/**/*.spec.ts', 'tests/**/*.spec.ts', 'src/server/**/*.spec.ts', 'emails/**/*.spec.ts'],
          exclude: ['tests/**/*.api.spec.ts', 'node_modules/**'],
          testTimeout: 120_000,
        },
      },
      {
        test: {
          name: 'api',
          include: ['tests/**/*.api.spec.ts'],
          globalSetup: ['tests/support/global-setup.ts'],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});

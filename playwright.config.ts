import { defineConfig } from '@playwright/test';

// The product runs already (scripts/test.mjs starts it with the demo); BASE_URL says where, CHROMIUM is Debian's browser.
export default defineConfig({
  testDir: 'e2e',
  outputDir: 'test-results',
  // Journeys share one demo association, so one follows the other.
  workers: 1,
  fullyParallel: false,
  retries: 0,
  // One test walks every page of a role in two sizes; on a busy machine that takes minutes. What hangs is told by the limits below.
  timeout: 240_000,
  expect: { timeout: 15_000 },
  use: {
    baseURL: process.env['BASE_URL'] ?? 'http://localhost:4000',
    navigationTimeout: 45_000,
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
      args: process.getuid?.() === 0 ? ['--no-sandbox'] : [],
    },
  },
});

import { basename, dirname } from 'node:path';
import { defineConfig } from '@playwright/test';

const { E2E_URL, E2E_REPORT } = process.env;
if (!E2E_URL) {
  throw new Error('These tests need the app that their command starts: npm run test:e2e -- [path]');
}
const run = basename(dirname(E2E_REPORT ?? 'run/report'));

/** The phone that the design is drawn for, and a small laptop. */
const PHONE = { width: 390, height: 844 };
const DESK = { width: 1280, height: 800 };

export default defineConfig({
  testDir: 'e2e',
  outputDir: `test-results/${run}`,
  globalSetup: './e2e/setup/global.ts',
  forbidOnly: true,
  // A browser on a loaded machine may stop drawing for minutes (seen once in 500 tests): one more
  // try, and the report names it flaky.
  retries: 1,
  workers: 2,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: E2E_REPORT ? [['list'], ['json', { outputFile: E2E_REPORT }]] : [['list']],
  use: {
    baseURL: E2E_URL,
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
      // The second half keeps the browser from calling home, which a test machine may not allow.
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
  projects: [
    { name: 'phone', use: { viewport: PHONE, hasTouch: true, isMobile: true } },
    // What people do at the tire is done on a phone; whom a route lets in depends on no size.
    { name: 'desk', testIgnore: /(\.phone|access)\.spec\.ts$/, use: { viewport: DESK } },
  ],
});

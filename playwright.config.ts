import { defineConfig, devices } from '@playwright/test';

const LAUNCH = {
  executablePath: '/usr/bin/chromium',
  args: [
    '--no-sandbox',
    '--disable-dev-shm-usage',
    // Nothing but the copy under test is ever reached.
    '--host-resolver-rules=MAP * ~NOTFOUND, EXCLUDE 127.0.0.1, EXCLUDE localhost',
  ],
};

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results',
  globalSetup: './tests/support/end-to-end-product.ts',
  forbidOnly: process.env['CI'] !== undefined,
  retries: 0,
  workers: 2,
  fullyParallel: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  use: {
    ...devices['Desktop Chrome'],
    // Known in the workers, which read this file again after the copy has been started.
    ...(process.env['PUBLIC_URL'] ? { baseURL: process.env['PUBLIC_URL'] } : {}),
    locale: 'en-GB',
    timezoneId: 'Europe/Lisbon',
    trace: 'retain-on-failure',
    launchOptions: LAUNCH,
  },
  projects: [
    { name: 'wide', use: { viewport: { width: 1440, height: 900 } } },
    // A spec asks for the small screen as well by the tag @narrow.
    { name: 'narrow', grep: /@narrow/, use: { viewport: { width: 390, height: 844 } } },
  ],
});

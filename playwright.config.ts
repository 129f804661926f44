import { defineConfig, devices } from '@playwright/test';

/** As root Chromium has no sandbox, and a machine of tests need not phone anybody. */
const CHROMIUM_OPTIONS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--autoplay-policy=no-user-gesture-required',
];

const result = process.env.E2E_RESULT;

export default defineConfig({
  testDir: './tests/e2e',
  outputDir: process.env.E2E_ARTIFACTS ?? './test-results',
  globalSetup: './tests/support/product.global.ts',
  workers: 1,
  retries: 0,
  forbidOnly: true,
  timeout: 90_000,
  expect: { timeout: 20_000 },
  reporter: result ? [['list'], ['json', { outputFile: result }]] : [['list']],
  use: {
    ...devices['Desktop Chrome'],
    viewport: { width: 1440, height: 900 },
    // Set by the global set-up, which starts the built program.
    baseURL: process.env.E2E_URL,
    launchOptions: { executablePath: '/usr/bin/chromium', args: CHROMIUM_OPTIONS },
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
  },
});

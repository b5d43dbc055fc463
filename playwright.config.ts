import { existsSync } from 'node:fs'
import { defineConfig } from '@playwright/test'

/** Debian's Chromium when it is there, else the browser that the test tool downloads. */
const chromium = '/usr/bin/chromium'

export default defineConfig({
  testDir: 'test/e2e',
  // Two shared cores: a browser and a server are enough at once. Each file starts its own server.
  workers: 1,
  fullyParallel: false,
  forbidOnly: true,
  retries: 0,
  timeout: 90_000,
  expect: { timeout: 15_000 },
  reporter: process.env.LEDGERLINE_E2E_REPORT
    ? [['line'], ['json', { outputFile: process.env.LEDGERLINE_E2E_REPORT }]]
    : [['list']],
  outputDir: 'test-results',
  globalSetup: './test/support/e2e-templates.ts',
  use: {
    browserName: 'chromium',
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    timezoneId: 'Europe/Berlin',
    actionTimeout: 10_000,
    navigationTimeout: 20_000,
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    launchOptions: {
      ...(existsSync(chromium) ? { executablePath: chromium } : {}),
      // Chromium refuses its sandbox to root.
      chromiumSandbox: process.getuid?.() !== 0,
      // No look-ups of its own: a works' network may be closed.
      args: [
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
})

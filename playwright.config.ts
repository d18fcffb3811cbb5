import { defineConfig } from '@playwright/test';

/** The whole product runs for these tests: `server/local/start.mjs` on a cluster and a port of its own. */
const port = 4311;

export default defineConfig({
  testDir: 'test/browser',
  outputDir: 'test-results',
  workers: 1,
  retries: 0,
  reporter: [['list'], ['json', { outputFile: 'reports/browser.json' }]],
  timeout: 90_000,
  use: {
    baseURL: `http://127.0.0.1:${port}`,
    viewport: { width: 1440, height: 900 },
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
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
  webServer: {
    command: 'exec node test/support/start-for-browser.mjs',
    url: `http://127.0.0.1:${port}/readyz`,
    env: { PORT: String(port) },
    timeout: 120_000,
    reuseExistingServer: false,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 15_000 },
  },
});

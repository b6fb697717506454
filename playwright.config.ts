import { defineConfig } from '@playwright/test';

const port = Number(process.env.E2E_PORT ?? 4399);
const baseURL = `http://127.0.0.1:${port}`;

/** Debian's Chromium; switched off: all that would ask hosts other than the app. */
const chromium = {
  executablePath: process.env.COMBWRIGHT_CHROMIUM ?? '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
};

export default defineConfig({
  testDir: 'e2e',
  timeout: 120_000,
  expect: { timeout: 15_000 },
  workers: 1,
  retries: 0,
  forbidOnly: true,
  use: { baseURL, actionTimeout: 20_000, trace: 'retain-on-failure', launchOptions: chromium, viewport: { width: 1440, height: 900 } },
  webServer: {
    command: 'exec node --import tsx e2e/support/serve.ts',
    url: `${baseURL}/api/health`,
    env: { E2E_PORT: String(port) },
    timeout: 120_000,
    reuseExistingServer: false,
    gracefulShutdown: { signal: 'SIGTERM', timeout: 15_000 },
  },
});

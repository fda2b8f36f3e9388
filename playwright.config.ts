import { defineConfig } from '@playwright/test';

export default defineConfig({
  testDir: 'tests/journeys',
  outputDir: 'test-results',
  timeout: 180_000,
  expect: { timeout: 15_000 },
  workers: 1,
  forbidOnly: true,
  reporter: [['list'], ['json', { outputFile: process.env.JOURNEYS_RESULT ?? 'test-results/journeys.json' }]],
  use: {
    baseURL: process.env.APP_URL ?? 'http://127.0.0.1:3000',
    viewport: { width: 1280, height: 900 },
    locale: 'en-US',
    timezoneId: 'America/New_York',
    trace: 'retain-on-failure',
    screenshot: 'only-on-failure',
    launchOptions: {
      executablePath: '/usr/bin/chromium',
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
});

import { defineConfig } from '@playwright/test';

export default defineConfig({
  testDir: 'tests/e2e',
  testMatch: '**/*.spec.ts',
  outputDir: 'test-results',
  globalSetup: './tests/e2e/buildOnce.ts',
  // Each has a database, a mail fake and a server of its own; a file's tests run one after the other.
  workers: 2,
  forbidOnly: true,
  retries: 0,
  timeout: 90_000,
  expect: { timeout: 10_000 },
  reporter: 'list',
  use: {
    actionTimeout: 15_000,
    screenshot: 'only-on-failure',
    // without a film of each action, which costs a third of the time of a long run
    trace: { mode: 'retain-on-failure', screenshots: false },
    launchOptions: {
      executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'],
    },
  },
});

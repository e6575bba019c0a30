import { defineConfig } from '@playwright/test';
import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';

const resultsFolder = fileURLToPath(new URL('../../test-results/browser', import.meta.url));

export default defineConfig({
  testDir: '.',
  testMatch: '*.spec.ts',
  outputDir: resultsFolder,
  globalSetup: './serve-page.ts',
  // The page itself keeps a second core busy with its worker.
  workers: Math.max(1, Math.floor(availableParallelism() / 2)),
  forbidOnly: true,
  retries: 0,
  timeout: 60_000,
  expect: { timeout: 15_000 },
  // Where the JSON goes is set by tests/run.mjs, through the environment.
  reporter: process.env.PLAYWRIGHT_JSON_OUTPUT_FILE ? [['list'], ['json']] : [['list']],
  use: {
    launchOptions: {
      executablePath: process.env.CHROMIUM || undefined,
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
        '--no-first-run',
      ],
    },
    viewport: { width: 1440, height: 900 },
    screenshot: 'only-on-failure',
  },
});

import { defineConfig } from '@playwright/test';

const port = Number(process.env.E2E_PORT ?? 4399);

/** Browser tests run against the built product with a data folder of their own, made anew each run. */
export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results',
  timeout: 60_000,
  workers: 1,
  forbidOnly: Boolean(process.env.CI),
  // The story publishes a new revision of the valve-cover sheet that the others read, so it is told last.
  projects: [
    { name: 'pages', testIgnore: 'story.spec.ts' },
    { name: 'story', testMatch: 'story.spec.ts' },
  ],
  use: {
    baseURL: `http://localhost:${port}`,
    trace: 'off',
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
      args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'],
    },
  },
  webServer: {
    command: 'rm -rf data/e2e && node server.mjs',
    url: `http://localhost:${port}/readyz`,
    timeout: 60_000,
    reuseExistingServer: false,
    env: {
      PORT: String(port),
      HOST: '127.0.0.1',
      DATA_DIR: 'data/e2e',
      DEMO: '1',
      NODE_ENV: 'production',
      APP_ORIGIN: '',
    },
  },
});

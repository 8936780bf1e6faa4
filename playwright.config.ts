import { execFileSync } from 'node:child_process';
import { defineConfig } from '@playwright/test';

/** Debian's own Chromium, nothing may download a browser: the one without windows, which is quicker. */
const chromium = execFileSync('sh', ['-c', 'command -v chromium-headless-shell'], { encoding: 'utf8' }).trim();

export default defineConfig({
  testDir: 'tests/browser',
  outputDir: 'test-results',
  // One set of services and one demo for all: stories run one after another.
  workers: 1,
  fullyParallel: false,
  timeout: 120_000,
  expect: { timeout: 20_000 },
  reporter: [['list'], ['json']],
  use: {
    baseURL: process.env.APP_URL,
    viewport: { width: 1440, height: 900 },
    screenshot: 'only-on-failure',
    // Recording every step of every story would take about as long as the stories; PLAYWRIGHT_TRACE=on looks into one.
    trace: process.env.PLAYWRIGHT_TRACE === 'on' ? 'retain-on-failure' : 'off',
    launchOptions: {
      executablePath: chromium,
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

import { defineConfig } from '@playwright/test';
import { demoPort, emptyPort } from './e2e/instances';

const flags = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

const instance = (port: number, { demo }: { demo: boolean }) => ({
  command: 'node server/scripts/throwaway-instance.mjs',
  cwd: new URL('..', import.meta.url).pathname,
  url: `http://127.0.0.1:${port}/api/ready`,
  env: { PORT: String(port), DEMO: demo ? 'yes' : 'no' },
  gracefulShutdown: { signal: 'SIGTERM' as const, timeout: 20_000 },
  timeout: 180_000,
  stdout: 'ignore' as const,
});

export default defineConfig({
  testDir: 'e2e',
  outputDir: '../test-results/browser',
  // Two people at work at once, as on the real thing; each journey keeps to its own mix.
  workers: 2,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  forbidOnly: Boolean(process.env.CI),
  use: {
    baseURL: `http://127.0.0.1:${demoPort}`,
    launchOptions: { executablePath: '/usr/bin/chromium', args: flags },
    viewport: { width: 1440, height: 900 },
    trace: 'retain-on-failure',
    actionTimeout: 15_000,
    navigationTimeout: 30_000,
  },
  projects: [
    { name: 'demo', testIgnore: '**/first-day.spec.ts' },
    {
      name: 'first day',
      testMatch: '**/first-day.spec.ts',
      use: { baseURL: `http://127.0.0.1:${emptyPort}` },
    },
  ],
  webServer: [instance(demoPort, { demo: true }), instance(emptyPort, { demo: false })],
});

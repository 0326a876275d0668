import { spawn } from 'node:child_process';
import { launch } from 'chrome-launcher';
import lighthouse from 'lighthouse';

const port = 4187;
const flags = ['--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run'];

/** The first screen as a stranger opens it, measured by Lighthouse as on a desk. */
export async function benchLighthouse(): Promise<string> {
  const instance = spawn(process.execPath, ['server/scripts/throwaway-instance.mjs'], {
    env: { ...process.env, PORT: String(port) },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  const ended = new Promise((resolve) => instance.once('exit', resolve));
  try {
    await answers(`http://127.0.0.1:${port}/api/ready`);
    const chromium = await launch({ chromePath: '/usr/bin/chromium', chromeFlags: flags });
    try {
      const result = await lighthouse(
        `http://127.0.0.1:${port}/sign-in`,
        { port: chromium.port, onlyCategories: ['performance', 'accessibility'], logLevel: 'error' },
        desk,
      );
      const score = (name: string) => Math.round((result?.lhr.categories[name]?.score ?? 0) * 100);
      return `Lighthouse on the first screen: performance ${score('performance')}, target at least 95; accessibility ${score('accessibility')}, target 100`;
    } finally {
      chromium.kill();
    }
  } finally {
    instance.kill('SIGTERM');
    await ended;
  }
}

const desk = {
  extends: 'lighthouse:default',
  settings: {
    formFactor: 'desktop' as const,
    screenEmulation: { mobile: false, width: 1350, height: 940, deviceScaleFactor: 1, disabled: false },
    throttling: {
      rttMs: 40,
      throughputKbps: 10_240,
      cpuSlowdownMultiplier: 1,
      requestLatencyMs: 0,
      downloadThroughputKbps: 0,
      uploadThroughputKbps: 0,
    },
  },
};

async function answers(address: string): Promise<void> {
  for (let attempt = 0; attempt < 600; attempt += 1) {
    const ok = await fetch(address).then(
      (response) => response.ok,
      () => false,
    );
    if (ok) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new Error(`${address} does not answer.`);
}

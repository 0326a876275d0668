import { runInNewContext } from 'node:vm';
import { expect, test } from '@playwright/test';
import { build } from 'esbuild';

type Proof = { allSeals(): Record<string, string> };

test('the browser seals every case of the shipped sets with the same bytes as Node', async ({ page }) => {
  test.setTimeout(240_000);
  const bundled = await build({
    entryPoints: [new URL('./all-seals.ts', import.meta.url).pathname],
    bundle: true,
    write: false,
    format: 'iife',
    globalName: 'proof',
    platform: 'browser',
    logLevel: 'error',
  });
  const script = bundled.outputFiles[0]?.text ?? '';
  const inNode = runInNewContext(`${script}; proof.allSeals()`, { TextEncoder, structuredClone, setTimeout });

  await page.goto('about:blank');
  await page.addScriptTag({ content: script });
  const inBrowser = await page.evaluate(() => (window as unknown as { proof: Proof }).proof.allSeals());

  expect(Object.keys(inBrowser).length).toBeGreaterThan(900);
  expect(inBrowser).toEqual({ ...inNode });
});

import { existsSync } from 'node:fs';
import { build } from 'esbuild';
import { inRoot, root } from './lib/paths.mjs';

/** Bundles our own code; packages stay where npm put them. */
const entryPoints = {
  main: 'server/main.ts',
  'decode-worker': 'server/workbook/decode-worker.ts',
};

await build({
  absWorkingDir: root,
  entryPoints: Object.fromEntries(
    Object.entries(entryPoints).filter(([, source]) => existsSync(inRoot(source))),
  ),
  outdir: process.argv[2] ?? inRoot('dist/server'),
  bundle: true,
  splitting: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  packages: 'external',
  sourcemap: true,
  logLevel: 'warning',
});

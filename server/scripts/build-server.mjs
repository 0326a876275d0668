import { build } from 'esbuild';
import { inRoot, root } from './lib/paths.mjs';

/**
 * Packages are bundled too: a start that resolves thousands of files in node_modules takes twice as long.
 * Outside stay what has native parts, starts threads of its own, or finds files beside itself.
 */
const external = [
  '@node-rs/argon2',
  'piscina',
  'pino',
  'pino-http',
  'pdfmake',
  '@expo-google-fonts/noto-sans',
  '@fontsource/*',
];

await build({
  absWorkingDir: root,
  entryPoints: {
    main: 'server/main.ts',
    'decode-worker': 'server/workbook/decode-worker.ts',
  },
  outdir: process.argv[2] ?? inRoot('dist/server'),
  bundle: true,
  splitting: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  external,
  // Packages in the older module format ask for `require`, which a module does not have.
  banner: {
    js: "import { createRequire as requireFrom } from 'node:module'; const require = requireFrom(import.meta.url);",
  },
  // Names stay, so that a stack says where it was; source maps would be parsed at every start.
  minifyWhitespace: true,
  minifySyntax: true,
  logLevel: 'warning',
});

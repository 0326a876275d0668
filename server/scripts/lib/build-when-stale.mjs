import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { inRoot, root } from './paths.mjs';
import { LauncherError, runQuietly } from './run-command.mjs';

const shared = ['shared', 'rules', 'package-lock.json', 'tsconfig.json'];

/** Builds web and server where their sources have changed since the last build. */
export async function buildWhenStale({ log = console.log } = {}) {
  await Promise.all([
    step({
      name: 'web',
      sources: ['web', 'vite.config.ts', 'tailwind.config.ts', ...shared],
      result: 'dist/web/index.html',
      build: () => runQuietly(process.execPath, ['node_modules/vite/bin/vite.js', 'build'], { cwd: root }),
      log,
    }),
    step({
      name: 'server',
      sources: ['server', 'tests/builders', 'tests/workbooks', ...shared],
      result: 'dist/server/main.js',
      build: () => runQuietly(process.execPath, ['server/scripts/build-server.mjs'], { cwd: root }),
      log,
    }),
  ]);
}

async function step({ name, sources, result, build, log }) {
  const stamp = inRoot('dist', `${name}.sources`);
  const wanted = hashSources(sources);
  if (existsSync(inRoot(result)) && existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  log(`Building ${name} …`);
  await build();
  if (!existsSync(inRoot(result))) throw new LauncherError(`The ${name} build left no ${result}.`);
  writeFileSync(stamp, wanted);
}

/** By content: a clone gives every file the time of the clone. */
function hashSources(sources) {
  const hash = createHash('sha256');
  for (const source of sources) {
    for (const file of filesUnder(inRoot(source))) {
      hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
    }
  }
  return hash.digest('hex');
}

function filesUnder(target) {
  if (!existsSync(target)) return [];
  const entries = readdirSyncOrNull(target);
  if (entries === null) return [target];
  return entries
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => filesUnder(path.join(target, entry.name)));
}

function readdirSyncOrNull(target) {
  try {
    return readdirSync(target, { withFileTypes: true });
  } catch (error) {
    if (error.code === 'ENOTDIR') return null;
    throw error;
  }
}

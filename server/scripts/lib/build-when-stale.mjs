import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { underBuildLock } from './build-lock.mjs';
import { inRoot, root } from './paths.mjs';
import { LauncherError, runQuietly } from './run-command.mjs';

const shared = ['shared', 'rules', 'package-lock.json', 'tsconfig.json'];

const targets = [
  {
    name: 'web',
    sources: ['web', 'vite.config.ts', 'tailwind.config.ts', ...shared],
    result: 'index.html',
    args: (outDir) => ['node_modules/vite/bin/vite.js', 'build', '--outDir', outDir],
  },
  {
    name: 'server',
    sources: ['server', 'tests/builders', 'tests/workbooks', ...shared],
    result: 'main.js',
    args: (outDir) => ['server/scripts/build-server.mjs', outDir],
  },
];

/** Builds web and server where their sources have changed since the last build. */
export async function buildWhenStale({ log = console.log } = {}) {
  if (targets.every((target) => isFresh(target))) return;
  await underBuildLock(() =>
    Promise.all(targets.filter((target) => !isFresh(target)).map((target) => build(target, log))),
  );
}

/** Beside the old one, which stays in place until the new one is whole. */
async function build({ name, sources, result, args }, log) {
  log(`Building ${name} …`);
  const wanted = hashSources(sources);
  const next = inRoot('dist', `${name}.next`);
  rmSync(next, { recursive: true, force: true });
  await runQuietly(process.execPath, args(next), { cwd: root });
  if (!existsSync(path.join(next, result))) throw new LauncherError(`The ${name} build made no ${result}.`);
  rmSync(inRoot('dist', name), { recursive: true, force: true });
  renameSync(next, inRoot('dist', name));
  writeFileSync(stampOf(name), wanted);
}

function isFresh({ name, sources, result }) {
  if (!existsSync(inRoot('dist', name, result)) || !existsSync(stampOf(name))) return false;
  return readFileSync(stampOf(name), 'utf8') === hashSources(sources);
}

function stampOf(name) {
  return inRoot('dist', `${name}.sources`);
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

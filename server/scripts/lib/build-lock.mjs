import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { inRoot } from './paths.mjs';
import { isAlive, waitUntil } from './processes.mjs';

/** Launchers of one checkout share its `dist/`: they build one after the other, the later ones find it built. */
export async function underBuildLock(work) {
  mkdirSync(inRoot('dist'), { recursive: true });
  const file = inRoot('dist', 'building.lock');
  const free = await waitUntil(() => take(file), { timeoutMs: 300_000, everyMs: 100 });
  if (!free) throw new Error(`${file} is held by a build that does not end.`);
  try {
    return await work();
  } finally {
    rmSync(file, { force: true });
  }
}

function take(file) {
  try {
    writeFileSync(file, String(process.pid), { flag: 'wx' });
    return true;
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
  }
  const holder = holderOf(file);
  if (holder !== null && !isAlive(holder)) rmSync(file, { force: true });
  return false;
}

/** Null while the holder has made the file but not yet written into it. */
function holderOf(file) {
  try {
    const pid = Number(readFileSync(file, 'utf8'));
    return pid > 0 ? pid : null;
  } catch (error) {
    if (error.code === 'ENOENT') return null;
    throw error;
  }
}

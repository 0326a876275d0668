import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import path from 'node:path';
import { commandLineOf, isAlive, stopProcess, waitUntil } from './processes.mjs';

/**
 * One launcher a data directory. Returns `{ running }` where another one holds it, else `{ lock }`.
 * A lock whose launcher is gone is taken over, once its server has gone too.
 */
export async function takeInstanceLock(directory) {
  mkdirSync(directory, { recursive: true, mode: 0o700 });
  const file = path.join(directory, 'instance.json');
  for (let attempt = 0; attempt < 5; attempt += 1) {
    if (create(file, { launcherPid: process.pid })) return { lock: lockOf(file) };
    const held = read(file);
    if (held && isOurLauncher(held.launcherPid)) return { running: held };
    await endOrphanedServer(held?.serverPid);
    rmSync(file, { force: true });
  }
  throw new Error(`${file} changes faster than it can be read.`);
}

export function readInstance(directory) {
  const held = read(path.join(directory, 'instance.json'));
  return held && isOurLauncher(held.launcherPid) ? held : null;
}

function lockOf(file) {
  return {
    /** Says more about the instance: the server's pid, its address. */
    update(facts) {
      const next = `${file}.next`;
      writeFileSync(next, JSON.stringify({ ...read(file), ...facts }));
      renameSync(next, file);
    },
    release() {
      if (read(file)?.launcherPid === process.pid) rmSync(file, { force: true });
    },
  };
}

function create(file, content) {
  try {
    const handle = openSync(file, 'wx', 0o600);
    writeFileSync(handle, JSON.stringify(content));
    closeSync(handle);
    return true;
  } catch (error) {
    if (error.code === 'EEXIST') return false;
    throw error;
  }
}

function read(file) {
  if (!existsSync(file)) return null;
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    // Cut short by a crash: it names no living launcher.
    return null;
  }
}

/** A pid may have been given to another program since. */
function isOurLauncher(pid) {
  if (pid === process.pid) return false;
  if (!isAlive(pid)) return false;
  const commandLine = commandLineOf(pid);
  return commandLine === null || /server\/scripts\/(start|dev|database)\.mjs/.test(commandLine);
}

/** The server stops by itself when its launcher is gone; give it the time to. */
async function endOrphanedServer(pid) {
  if (!isAlive(pid)) return;
  if (!/server\/main/.test(commandLineOf(pid) ?? '')) return;
  if (await waitUntil(() => !isAlive(pid), { timeoutMs: 15_000 })) return;
  await stopProcess(pid);
}

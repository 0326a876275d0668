import { readFileSync } from 'node:fs';
import net from 'node:net';
import { setTimeout as sleep } from 'node:timers/promises';

export function isAlive(pid) {
  if (!Number.isInteger(pid) || pid <= 0) return false;
  try {
    process.kill(pid, 0);
    return !isZombie(pid);
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** A killed child whose parent has not collected it still answers signal 0. */
function isZombie(pid) {
  try {
    return /^\d+ \(.*\) Z/s.test(readFileSync(`/proc/${pid}/stat`, 'utf8'));
  } catch {
    return false;
  }
}

/** The command line of a process, or null where the system does not tell. Guards against a reused pid. */
export function commandLineOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').join(' ').trim();
  } catch {
    return null;
  }
}

/** True once the condition held, false when the time ran out. */
export async function waitUntil(condition, { timeoutMs, everyMs = 25 }) {
  const deadline = Date.now() + timeoutMs;
  while (Date.now() < deadline) {
    if (await condition()) return true;
    await sleep(everyMs);
  }
  return false;
}

/** Asks a process to stop and insists after a while. */
export async function stopProcess(pid, { graceMs = 10_000 } = {}) {
  if (!isAlive(pid)) return;
  process.kill(pid, 'SIGTERM');
  if (await waitUntil(() => !isAlive(pid), { timeoutMs: graceMs })) return;
  if (isAlive(pid)) process.kill(pid, 'SIGKILL');
  await waitUntil(() => !isAlive(pid), { timeoutMs: 2_000 });
}

export function portIsFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

export function freePort() {
  return new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

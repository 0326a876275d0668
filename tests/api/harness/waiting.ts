import { setTimeout as sleep } from 'node:timers/promises';

/** Waits for a state of the database that another part of the process brings about. */
export async function eventually(holds: () => Promise<boolean> | boolean, timeoutMs = 10_000): Promise<void> {
  const deadline = Date.now() + timeoutMs;
  while (!(await holds())) {
    if (Date.now() > deadline) throw new Error('It did not happen in time.');
    await sleep(20);
  }
}

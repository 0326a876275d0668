import { takeInstanceLock } from './instance-lock.mjs';

/** Takes the data directory for this launcher; null, with a line that says so, where another has it. */
export async function holdInstance(supervisor, directory) {
  const { running, lock } = await takeInstanceLock(directory);
  if (running) {
    const where = running.url ? `at ${running.url}` : 'and is still starting';
    console.log(`Clauseway already runs here ${where} (process ${running.launcherPid}).`);
    return null;
  }
  supervisor.onStop(() => lock.release());
  return lock;
}

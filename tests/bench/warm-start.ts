import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

const port = 4188;

/** From the command to the first answer: once with nothing there but packages and build, then again. */
export async function benchStart(): Promise<string> {
  const directory = mkdtempSync(path.join(os.tmpdir(), 'clauseway-start-'));
  try {
    const first = await timeStart(directory);
    const warm = await timeStart(directory);
    return `start with packages and build there: first ${first.toFixed(1)} s with database and demo made, warm ${warm.toFixed(1)} s, target at most 2 warm`;
  } finally {
    rmSync(directory, { recursive: true, force: true });
  }
}

async function timeStart(directory: string): Promise<number> {
  const start = performance.now();
  const launcher = spawn(process.execPath, ['server/scripts/start.mjs'], {
    env: { ...process.env, PORT: String(port), CLAUSEWAY_DATA: directory },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  const ended = new Promise((resolve) => launcher.once('exit', resolve));
  try {
    for (;;) {
      const answered = await fetch(`http://127.0.0.1:${port}/api/ready`).then(
        (response) => response.ok,
        () => false,
      );
      if (answered) return (performance.now() - start) / 1000;
      if (launcher.exitCode !== null) throw new Error(`The launcher ended with ${launcher.exitCode}.`);
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
  } finally {
    launcher.kill('SIGTERM');
    await ended;
  }
}

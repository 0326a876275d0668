import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { eventually } from './waiting';

const parent = existsSync('/dev/shm') ? '/dev/shm' : os.tmpdir();

export interface Launched {
  child: ChildProcess;
  /** Everything that it has printed so far. */
  output(): string;
  exitCode: Promise<number | null>;
}

/** A directory for an instance of the product, and the means to start it there and to see what runs on it. */
export function makeInstance() {
  const directory = mkdtempSync(path.join(parent, 'clauseway-launch-'));
  const started: Launched[] = [];
  return {
    directory,
    launch(script: string, args: string[] = [], env: Record<string, string> = {}): Launched {
      const launched = launch(script, args, {
        CLAUSEWAY_DATA: directory,
        CLAUSEWAY_THROWAWAY: 'yes',
        ...env,
      });
      started.push(launched);
      return launched;
    },
    /** Command lines of living processes that work on the directory. */
    processes: () => processesOn(directory),
    async remove() {
      for (const { child } of started) child.kill('SIGTERM');
      await Promise.all(started.map(({ exitCode }) => exitCode));
      for (const { pid } of processesOn(directory)) process.kill(pid, 'SIGKILL');
      await eventually(() => processesOn(directory).length === 0);
      rmSync(directory, { recursive: true, force: true });
    },
  };
}

function launch(script: string, args: string[], env: Record<string, string>): Launched {
  const { DATABASE_URL: _, ...environment } = process.env;
  const child = spawn(process.execPath, [`server/scripts/${script}`, ...args], {
    env: { ...environment, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const parts: string[] = [];
  for (const stream of [child.stdout, child.stderr]) {
    stream?.on('data', (part: Buffer) => parts.push(part.toString()));
  }
  return {
    child,
    output: () => parts.join(''),
    exitCode: new Promise((resolve) => child.once('exit', (code) => resolve(code))),
  };
}

/** Waits until the product says that it is ready; a start that fails shows what it printed. */
export async function untilReady(launched: Launched, timeoutMs: number): Promise<void> {
  let ended = false;
  void launched.exitCode.then(() => {
    ended = true;
  });
  await eventually(() => ended || launched.output().includes('Ctrl-C'), timeoutMs);
  if (ended) throw new Error(`The product did not start:\n${launched.output()}`);
}

/** The server carries the directory in its environment, the database in its arguments. */
function processesOn(directory: string): { pid: number; command: string }[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .flatMap((name) => {
      const command = readProcess(name, 'cmdline');
      const belongs = command.includes(directory) || readProcess(name, 'environ').includes(`=${directory}\0`);
      return belongs && command !== '' ? [{ pid: Number(name), command }] : [];
    });
}

function readProcess(pid: string, file: string): string {
  try {
    return readFileSync(`/proc/${pid}/${file}`, 'utf8');
  } catch {
    // It has ended in the meantime, or is not ours to look into.
    return '';
  }
}

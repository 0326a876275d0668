import { spawn, spawnSync } from 'node:child_process';

/** Runs a command with the terminal's own output and resolves with its exit code. */
export function runCommand(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: 'inherit', ...options });
    child.on('error', reject);
    child.on('exit', (code, signal) => resolve(signal ? 1 : (code ?? 1)));
  });
}

/** Runs a command quietly; its output is shown only where it failed. */
export async function runQuietly(command, args, options = {}) {
  const output = [];
  const code = await new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    child.stdout.on('data', (part) => output.push(part));
    child.stderr.on('data', (part) => output.push(part));
    child.on('error', reject);
    child.on('exit', (exitCode) => resolve(exitCode ?? 1));
  });
  if (code === 0) return;
  process.stderr.write(Buffer.concat(output));
  throw new LauncherError(`${command} ${args.join(' ')} ended with ${code}`);
}

export function commandExists(command) {
  return spawnSync('sh', ['-c', `command -v ${command}`], { stdio: 'ignore' }).status === 0;
}

export function isRoot() {
  return process.getuid?.() === 0;
}

/** A failure that one line explains; anything else keeps its stack. */
export class LauncherError extends Error {}

export function reportAndExit(error) {
  if (error instanceof LauncherError) console.error(error.message);
  else console.error(error);
  process.exit(1);
}

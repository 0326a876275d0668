import { spawn } from 'node:child_process';
import { appendFileSync, mkdirSync, openSync } from 'node:fs';
import path from 'node:path';
import { ensureDebianPackages } from './ensure-debian-packages.mjs';
import { databaseInitStatements, databaseUrls, localSecrets } from './local-settings.mjs';
import { inRoot, root } from './paths.mjs';
import { startPrivateDatabase, stopPrivateDatabase } from './private-database.mjs';

/** Where the private instance keeps everything; another place makes another instance. */
export function dataDirectory() {
  return process.env.CLAUSEWAY_DATA ? path.resolve(process.env.CLAUSEWAY_DATA) : inRoot('.data');
}

/** Starts or finds the private MariaDB and returns the settings that point to it. */
export async function startLocalDatabase(directory) {
  await ensureDebianPackages(['mariadb-server']);
  const secrets = localSecrets(directory);
  const database = await startPrivateDatabase({
    directory,
    initStatements: databaseInitStatements(secrets),
    throwaway: process.env.CLAUSEWAY_THROWAWAY === 'yes',
  });
  return {
    reused: database.reused,
    env: { ...databaseUrls(secrets, database.socket), SESSION_SECRET: secrets.session },
    stop: () => stopPrivateDatabase(directory),
  };
}

/**
 * Starts the server with a channel to us: when we are gone the channel closes and it stops by itself.
 * Resolves with `{ child, ready }`; `ready` carries what the server says once it listens.
 */
export function spawnServer({ command, args, env, logFile }) {
  const output = logFile ? openLog(logFile) : 'inherit';
  const child = spawn(command, args, {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', output, logFile ? output : 'inherit', 'ipc'],
    // Ctrl-C goes to the whole group: only the launcher may hear it, so that it stops things in order.
    detached: true,
  });
  const ready = new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) => reject(new Error(`The server ended with ${code} before it was ready.`)));
    child.on('message', (message) => {
      if (message?.kind === 'ready') resolve(message);
      if (message?.kind === 'refused') reject(new Error(message.detail));
    });
  });
  return { child, ready };
}

function openLog(file) {
  mkdirSync(path.dirname(file), { recursive: true });
  appendFileSync(file, '');
  return openSync(file, 'a', 0o600);
}

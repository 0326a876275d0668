import { spawn } from 'node:child_process';
import { appendFileSync, mkdirSync, openSync } from 'node:fs';
import path from 'node:path';
import { ensureDebianPackages } from './ensure-debian-packages.mjs';
import { databaseInitStatements, databaseUrls, localSecrets } from './local-settings.mjs';
import { inRoot, root } from './paths.mjs';
import { databaseFiles, startPrivateDatabase, stopPrivateDatabase } from './private-database.mjs';
import { portIsFree } from './processes.mjs';
import { LauncherError } from './run-command.mjs';

/** Where the private instance keeps everything; another place makes another instance. */
export function dataDirectory() {
  return process.env.CLAUSEWAY_DATA ? path.resolve(process.env.CLAUSEWAY_DATA) : inRoot('.data');
}

/** Starts or finds the private MariaDB. */
export async function startLocalDatabase(directory, supervisor) {
  await ensureDebianPackages(['mariadb-server']);
  const secrets = localSecrets(directory);
  await startPrivateDatabase({
    directory,
    initStatements: databaseInitStatements(secrets),
    throwaway: process.env.CLAUSEWAY_THROWAWAY === 'yes',
  });
  supervisor.onStop(() => stopPrivateDatabase(directory));
}

/** The settings that point a server to the private MariaDB of a directory, whether or not it is up yet. */
export function localDatabaseEnv(directory) {
  const secrets = localSecrets(directory);
  const { socket, pidFile } = databaseFiles(directory);
  return {
    ...databaseUrls(secrets, socket),
    SESSION_SECRET: secrets.session,
    CLAUSEWAY_DATABASE_PID_FILE: pidFile,
  };
}

/** A port that was asked for is used or refused; the usual one gives way to its neighbours. */
export async function choosePort() {
  if (process.env.PORT) return Number(process.env.PORT);
  for (let port = 4170; port < 4180; port += 1) {
    if (await portIsFree(port)) return port;
  }
  throw new LauncherError('The ports 4170 to 4179 are all in use: set PORT to a free one.');
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
  const where = logFile ? ` Its log is ${logFile}` : '';
  const ready = new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) =>
      reject(new LauncherError(`The server ended with ${code} before it was ready.${where}`)),
    );
    child.on('message', (message) => {
      if (message?.kind === 'ready') resolve(message);
      if (message?.kind === 'refused') reject(new LauncherError(`${message.detail}${where}`));
    });
  });
  return { child, ready };
}

function openLog(file) {
  mkdirSync(path.dirname(file), { recursive: true });
  appendFileSync(file, '');
  return openSync(file, 'a', 0o600);
}

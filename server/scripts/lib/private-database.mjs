import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { findCommand } from './ensure-debian-packages.mjs';
import { commandLineOf, freePort, isAlive, stopProcess, waitUntil } from './processes.mjs';
import { isRoot, LauncherError, runQuietly } from './run-command.mjs';

/** Bytes of sun_path in a Unix socket address, its closing zero included. */
const maximumSocketPathBytes = 107;

/**
 * A MariaDB of our own on loopback, its data in one directory. One that already answers on the socket
 * is used as it is: after a killed launcher the database may have outlived it.
 *
 * directory: where data, socket, pid file and log live
 * initStatements: one-line SQL statements, run at every start, so each must bear repetition
 * throwaway: no durability, for tests
 */
export async function startPrivateDatabase({ directory, initStatements, throwaway = false }) {
  const files = databaseFiles(directory);
  mkdirSync(files.temporary, { recursive: true, mode: 0o700 });
  if (await answers(files.socket)) return { ...files, reused: true };
  await install(files.data);
  writeFileSync(files.init, `${initStatements.join('\n')}\n`, { mode: 0o600 });
  const port = await freePort();
  // Its own session: Ctrl-C reaches the launcher alone, which stops the server before the database.
  const child = spawn(findCommand('mariadbd'), serverArguments({ files, port, throwaway }), {
    stdio: 'ignore',
    detached: true,
  });
  child.unref();
  const up = await waitUntil(() => child.exitCode !== null || answers(files.socket), { timeoutMs: 60_000 });
  if (!up || child.exitCode !== null) {
    if (isAlive(child.pid)) await stopProcess(child.pid);
    throw new LauncherError(`MariaDB did not start. Its last words are in ${files.log}`);
  }
  return { ...files, reused: false };
}

/** Stops the database whose pid file lies in the directory; a pid that belongs to another program is left alone. */
export async function stopPrivateDatabase(directory) {
  const files = databaseFiles(directory);
  const pid = databasePid(files);
  if (pid !== null) await stopProcess(pid, { graceMs: 20_000 });
}

export function databaseFiles(directory) {
  return {
    data: path.join(directory, 'mariadb'),
    socket: socketPath(directory),
    pidFile: path.join(directory, 'mariadb.pid'),
    log: path.join(directory, 'mariadb.log'),
    init: path.join(directory, 'mariadb-init.sql'),
    // Its own: at its start a MariaDB clears the temporary tables that it finds, also those of another that runs.
    temporary: path.join(directory, 'mariadb-tmp'),
  };
}

export function databasePid(files) {
  if (!existsSync(files.pidFile)) return null;
  const pid = Number(readFileSync(files.pidFile, 'utf8').trim());
  if (!isAlive(pid)) return null;
  const commandLine = commandLineOf(pid);
  return commandLine === null || commandLine.includes(files.data) ? pid : null;
}

/** A deep checkout would overflow the socket address, so the socket moves to the temporary directory. */
function socketPath(directory) {
  const wanted = path.join(directory, 'mariadb.sock');
  if (Buffer.byteLength(wanted) <= maximumSocketPathBytes) return wanted;
  const name = createHash('sha256').update(directory).digest('hex').slice(0, 16);
  const folder = path.join(os.tmpdir(), `clauseway-${process.getuid?.() ?? 0}`);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  return path.join(folder, `${name}.sock`);
}

async function install(data) {
  if (existsSync(path.join(data, 'mysql'))) return;
  rmSync(data, { recursive: true, force: true });
  const user = isRoot() ? ['--user=root'] : [];
  await runQuietly(findCommand('mariadb-install-db'), [
    '--no-defaults',
    `--datadir=${data}`,
    '--skip-test-db',
    '--auth-root-authentication-method=socket',
    ...user,
  ]);
}

function serverArguments({ files, port, throwaway }) {
  return [
    '--no-defaults',
    `--datadir=${files.data}`,
    `--tmpdir=${files.temporary}`,
    `--socket=${files.socket}`,
    `--pid-file=${files.pidFile}`,
    `--log-error=${files.log}`,
    `--init-file=${files.init}`,
    '--bind-address=127.0.0.1',
    `--port=${port}`,
    '--skip-name-resolve',
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    '--default-time-zone=+00:00',
    '--max-allowed-packet=64M',
    ...(isRoot() ? ['--user=root'] : []),
    ...(throwaway ? ['--innodb-flush-log-at-trx-commit=0', '--skip-innodb-doublewrite'] : []),
  ];
}

/** MariaDB speaks first: a packet whose fifth byte is its protocol version, 10. */
function answers(socket) {
  return new Promise((resolve) => {
    const connection = net.connect(socket);
    const end = (result) => {
      connection.destroy();
      resolve(result);
    };
    connection.setTimeout(2_000, () => end(false));
    connection.once('error', () => end(false));
    connection.once('data', (packet) => end(packet[4] === 10));
  });
}

import path from 'node:path';
import { buildWhenStale } from './lib/build-when-stale.mjs';
import { ensurePackages } from './lib/ensure-packages.mjs';
import { holdInstance } from './lib/hold-instance.mjs';
import {
  choosePort,
  dataDirectory,
  localDatabaseEnv,
  spawnServer,
  startLocalDatabase,
} from './lib/local-instance.mjs';
import { printWelcome } from './lib/print-welcome.mjs';
import { stopProcess } from './lib/processes.mjs';
import { createSupervisor } from './lib/supervisor.mjs';

/** Only Node's own modules in the launcher: it runs before any package is installed. */
const supervisor = createSupervisor();
await supervisor.run(process.env.DATABASE_URL ? startExternal : startPrivate);

/** Everything on this machine, in one directory. */
async function startPrivate() {
  const directory = dataDirectory();
  const lock = await holdInstance(supervisor, directory);
  if (!lock) return;
  await ensurePackages();
  const database = supervisor.begin(() => startLocalDatabase(directory, supervisor));
  // Its failure is told where it is waited for, below.
  database.catch(() => undefined);
  await buildWhenStale();
  await startServer({
    lock,
    database,
    logFile: path.join(directory, 'server.log'),
    env: {
      ...localDatabaseEnv(directory),
      PORT: String(await choosePort()),
      CLAUSEWAY_INSTANCE: 'private',
      CLAUSEWAY_DATA: directory,
      CLAUSEWAY_DATABASE_STARTS: 'yes',
    },
  });
}

/** A database of one's own: nothing local is started and nothing is seeded. */
async function startExternal() {
  await ensurePackages();
  await buildWhenStale();
  await startServer({
    lock: null,
    database: null,
    logFile: undefined,
    env: { CLAUSEWAY_INSTANCE: 'external' },
  });
}

async function startServer({ lock, database, logFile, env }) {
  if (supervisor.stopping) return;
  const { child, ready } = spawnServer({
    command: process.execPath,
    args: ['dist/server/main.js'],
    env: { NODE_ENV: 'production', ...env },
    logFile,
  });
  supervisor.onStop(() => stopProcess(child.pid, { graceMs: 15_000 }));
  lock?.update({ serverPid: child.pid });
  if (database) {
    await database;
    if (child.connected) child.send('database is up');
  }
  const message = await ready;
  child.once('exit', (code) => void supervisor.stop(code === 0 ? 0 : 1, `The server ended with ${code}.`));
  lock?.update({ url: message.url });
  printWelcome(message, { logFile });
}

import path from 'node:path';
import { buildWhenStale } from './lib/build-when-stale.mjs';
import { ensurePackages } from './lib/ensure-packages.mjs';
import { takeInstanceLock } from './lib/instance-lock.mjs';
import { dataDirectory, spawnServer, startLocalDatabase } from './lib/local-instance.mjs';
import { printWelcome } from './lib/print-welcome.mjs';
import { isAlive, portIsFree, stopProcess } from './lib/processes.mjs';
import { LauncherError, reportAndExit } from './lib/run-command.mjs';

/** Only Node's own modules here: this runs before any package is installed. */
const external = Boolean(process.env.DATABASE_URL);
const stops = [];
let stopping = false;
let instance;

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stop(0));

await start().catch(async (error) => {
  if (stopping) return;
  await runStops();
  reportAndExit(error);
});

async function start() {
  const directory = dataDirectory();
  if (!external && !(await holdInstance(directory))) return;
  await ensurePackages();
  const [database] = await Promise.all([external ? null : localDatabase(directory), buildWhenStale()]);
  if (stopping) return;
  const logFile = external ? undefined : path.join(directory, 'server.log');
  const { child, ready } = spawnServer({
    command: process.execPath,
    args: ['--enable-source-maps', 'dist/server/main.js'],
    env: { NODE_ENV: 'production', ...(external ? {} : await localEnv(directory, database)) },
    logFile,
  });
  stops.push(() => stopProcess(child.pid, { graceMs: 15_000 }));
  instance?.update({ serverPid: child.pid });
  const message = await ready.catch((error) => {
    throw new LauncherError(logFile ? `${error.message} The log is ${logFile}` : error.message);
  });
  child.once('exit', (code) => void stop(code === 0 ? 0 : 1, `The server ended with ${code}.`));
  if (!isAlive(child.pid)) return stop(1, 'The server ended.');
  instance?.update({ url: message.url });
  printWelcome(message, { logFile });
}

async function holdInstance(directory) {
  const taken = await takeInstanceLock(directory);
  if (taken.running) {
    const where = taken.running.url ? `at ${taken.running.url}` : 'and is still starting';
    console.log(`Clauseway already runs here ${where} (process ${taken.running.launcherPid}).`);
    return false;
  }
  instance = taken.lock;
  stops.push(() => instance.release());
  return true;
}

async function localDatabase(directory) {
  const database = await startLocalDatabase(directory);
  stops.push(() => database.stop());
  return database;
}

async function localEnv(directory, database) {
  const port = await choosePort();
  return {
    ...database.env,
    PORT: String(port),
    CLAUSEWAY_INSTANCE: 'private',
    CLAUSEWAY_DATA: directory,
  };
}

/** A port that was asked for is used or refused; the usual one gives way to its neighbours. */
async function choosePort() {
  if (process.env.PORT) return Number(process.env.PORT);
  for (let port = 4170; port < 4180; port += 1) {
    if (await portIsFree(port)) return port;
  }
  throw new LauncherError('The ports 4170 to 4179 are all in use: set PORT to a free one.');
}

async function stop(code, reason) {
  if (stopping) return;
  stopping = true;
  if (reason) console.error(reason);
  await runStops();
  process.exit(code);
}

/** In reverse: the server before its database, the lock last. */
async function runStops() {
  while (stops.length > 0) await stops.pop()();
}

import { spawn } from 'node:child_process';
import { watch } from 'node:fs';
import path from 'node:path';
import { ensurePackages } from './lib/ensure-packages.mjs';
import { holdInstance } from './lib/hold-instance.mjs';
import {
  choosePort,
  dataDirectory,
  localDatabaseEnv,
  spawnServer,
  startLocalDatabase,
} from './lib/local-instance.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { printWelcome } from './lib/print-welcome.mjs';
import { freePort, stopProcess } from './lib/processes.mjs';
import { createSupervisor } from './lib/supervisor.mjs';

/** Server and web from their sources, each changed file taken up at once, mail caught and shown. */
const supervisor = createSupervisor();
await supervisor.run(async () => {
  const directory = dataDirectory();
  const lock = await holdInstance(supervisor, directory);
  if (!lock) return;
  await ensurePackages();
  await supervisor.begin(() => startLocalDatabase(directory, supervisor));
  const webPort = await choosePort();
  const apiPort = await freePort();
  const logFile = path.join(directory, 'server.log');
  const server = keepServerFresh({
    logFile,
    env: {
      ...localDatabaseEnv(directory),
      NODE_ENV: 'development',
      PORT: String(apiPort),
      PUBLIC_URL: `http://127.0.0.1:${webPort}`,
      CLAUSEWAY_INSTANCE: 'development',
      CLAUSEWAY_DATA: directory,
    },
    onStart: (child) => lock.update({ serverPid: child.pid }),
  });
  supervisor.onStop(() => server.stop());
  const message = await server.ready;
  startWeb({ webPort, apiPort });
  lock.update({ url: message.url });
  printWelcome(message, { logFile });
});

/** Starts the server again after a change; one that does not start is left until the next change. */
function keepServerFresh({ logFile, env, onStart }) {
  let current = null;
  let restart = null;
  const ready = new Promise((resolve) => {
    start();
    function start() {
      const { child, ready: started } = spawnServer({
        command: process.execPath,
        args: ['--import', 'tsx', 'server/main.ts'],
        env,
        logFile,
      });
      current = child;
      onStart(child);
      started.then(resolve, (error) => child.killed || console.error(error.message));
    }
    const again = () => {
      clearTimeout(restart);
      restart = setTimeout(async () => {
        current.kill();
        await stopProcess(current.pid);
        start();
      }, 300);
    };
    for (const name of ['server', 'shared', 'rules']) watch(inRoot(name), { recursive: true }, again).unref();
  });
  return {
    ready,
    async stop() {
      clearTimeout(restart);
      await stopProcess(current.pid);
    },
  };
}

function startWeb({ webPort, apiPort }) {
  const web = spawn(
    process.execPath,
    ['node_modules/vite/bin/vite.js', '--port', String(webPort), '--strictPort', '--host', '127.0.0.1'],
    { cwd: root, stdio: 'inherit', env: { ...process.env, CLAUSEWAY_API: `http://127.0.0.1:${apiPort}` } },
  );
  supervisor.onStop(() => stopProcess(web.pid));
  web.once('exit', (code) => void supervisor.stop(code ?? 1, 'The web server ended.'));
}

import { existsSync, rmSync } from 'node:fs';
import path from 'node:path';
import { ensurePackages } from './lib/ensure-packages.mjs';
import { holdInstance } from './lib/hold-instance.mjs';
import { readInstance } from './lib/instance-lock.mjs';
import { dataDirectory, localDatabaseEnv, startLocalDatabase } from './lib/local-instance.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { stopPrivateDatabase } from './lib/private-database.mjs';
import { LauncherError, runCommand } from './lib/run-command.mjs';
import { createSupervisor } from './lib/supervisor.mjs';

/** `reset`: the private database from nothing to the demo. `seed`: the demo into the database of DATABASE_URL too. */
const command = process.argv[2];
const external = Boolean(process.env.DATABASE_URL);
const supervisor = createSupervisor();

await supervisor.run(async () => {
  if (command === 'reset') await reset();
  else if (command === 'seed') await seed();
  else throw new LauncherError('Use: npm run db:reset, or npm run db:seed.');
  await supervisor.stop(0);
});

async function reset() {
  if (external) {
    throw new LauncherError(
      'DATABASE_URL is set: an external database is never reset. Unset it to reset the private one.',
    );
  }
  const directory = dataDirectory();
  if (readInstance(directory)) {
    throw new LauncherError('Clauseway runs on this database: stop it first, then reset.');
  }
  if (!(await holdInstance(supervisor, directory))) return;
  await stopPrivateDatabase(directory);
  for (const name of ['mariadb', 'demo-workbooks']) {
    const target = path.join(directory, name);
    if (existsSync(target)) rmSync(target, { recursive: true, force: true });
  }
  await seedPrivate(directory);
  console.log('The private database is new and holds the demo.');
}

async function seed() {
  if (external) {
    await ensurePackages();
    return runSeed({ CLAUSEWAY_INSTANCE: 'external' });
  }
  const directory = dataDirectory();
  if (readInstance(directory)) {
    console.log('Clauseway runs on this database and has seeded it at its start.');
    return;
  }
  if (!(await holdInstance(supervisor, directory))) return;
  await seedPrivate(directory);
}

async function seedPrivate(directory) {
  await ensurePackages();
  await supervisor.begin(() => startLocalDatabase(directory, supervisor));
  await runSeed({ ...localDatabaseEnv(directory), CLAUSEWAY_INSTANCE: 'private', CLAUSEWAY_DATA: directory });
}

async function runSeed(env) {
  const code = await runCommand(process.execPath, ['--import', 'tsx', inRoot('server/db/seed/seed.ts')], {
    cwd: root,
    env: { ...process.env, ...env },
  });
  if (code !== 0) throw new LauncherError('The demo was not seeded, see above.');
}

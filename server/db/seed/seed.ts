import { randomUUID } from 'node:crypto';
import { createDeps } from '../../create-deps';
import type { Wake } from '../../deps';
import { parseSettings, SettingsError } from '../../env';
import { createLog } from '../../log';
import { prepareDatabase } from '../../prepare-database';
import { createWorkbookPool } from '../../workbook/pool';
import { checkDatabase } from '../check-database';
import { connect } from '../client';
import { demoPassword } from './demo-people';
import { seedDemo } from './seed-demo';

const asleep: Wake = { jobs: () => undefined, mail: () => undefined };

/** The demo by an explicit order, into whichever database the settings name. */
async function main(): Promise<void> {
  const settings = parseSettings(process.env);
  const log = createLog('warn');
  await prepareDatabase(settings, randomUUID());
  const connection = connect(settings.databaseUrl);
  const pool = createWorkbookPool();
  try {
    await checkDatabase(connection.pool, log);
    const { seeded } = await seedDemo(createDeps({ settings, connection, log, pool, wake: asleep }));
    const done = seeded ? 'The demo is seeded.' : 'The demo was there already.';
    process.stdout.write(`${done} Every demo person signs in with the password ${demoPassword}\n`);
  } finally {
    await pool.close();
    await connection.close();
  }
}

main().catch((error: unknown) => {
  const known = error instanceof SettingsError;
  process.stderr.write(`${known ? error.message : error instanceof Error ? error.stack : String(error)}\n`);
  process.exitCode = 1;
});

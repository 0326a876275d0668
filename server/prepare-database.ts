import path from 'node:path';
import { migrate } from './db/migrate';
import type { Settings } from './env';

/** Migrates as the owner where one is given; else the database is taken as it is. */
export async function prepareDatabase(settings: Settings, owner: string): Promise<void> {
  if (!settings.migrationUrl) return;
  await migrate({
    ownerUrl: settings.migrationUrl,
    applicationUrl: settings.databaseUrl,
    folder: path.resolve('drizzle'),
    owner,
  });
}

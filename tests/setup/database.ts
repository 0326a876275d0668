import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { startPrivateDatabase, stopPrivateDatabase } from '../../server/scripts/lib/private-database.mjs';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Socket of the MariaDB that the run started. */
    databaseSocket: string;
  }
}

/** One MariaDB for the run, in memory where the machine has the means; every test file makes a database in it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const parent = existsSync('/dev/shm') ? '/dev/shm' : os.tmpdir();
  const directory = mkdtempSync(path.join(parent, 'clauseway-test-'));
  const database = await startPrivateDatabase({
    directory,
    throwaway: true,
    initStatements: [
      "CREATE USER IF NOT EXISTS 'owner'@'localhost' IDENTIFIED BY 'owner';",
      "GRANT ALL PRIVILEGES ON *.* TO 'owner'@'localhost' WITH GRANT OPTION;",
      "CREATE USER IF NOT EXISTS 'application'@'localhost' IDENTIFIED BY 'application';",
    ],
  });
  project.provide('databaseSocket', database.socket);
  return async () => {
    await stopPrivateDatabase(directory);
    rmSync(directory, { recursive: true, force: true });
  };
}

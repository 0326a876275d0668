import type { Pool, RowDataPacket } from 'mysql2/promise';
import type { Logger } from 'pino';
import { limits } from '#shared/limits';
import { appendOnlyTables } from './migrate';

/** What an external database may lack is told at the start, not by the first upload. */
export async function checkDatabase(pool: Pool, log: Logger): Promise<void> {
  const [variables] = await pool.query<RowDataPacket[]>('SELECT @@max_allowed_packet AS packet');
  const packet = Number(variables[0]?.packet ?? 0);
  // A file travels in one statement, as text with escapes at worst twice its size.
  const needed = limits.workbookBytes * 2;
  if (packet < needed) {
    throw new Error(
      `The database takes packets of ${packet} bytes; workbooks need max_allowed_packet of at least ${needed}.`,
    );
  }
  const [tables] = await pool.query<RowDataPacket[]>("SHOW TABLES LIKE 'audit'");
  if (tables.length === 0) {
    throw new Error('The database has no tables yet: set DATABASE_MIGRATION_URL once to migrate it.');
  }
  const [grants] = await pool.query<RowDataPacket[]>('SHOW GRANTS FOR CURRENT_USER()');
  const wide = grants
    .map((row) => String(Object.values(row)[0]))
    .filter((grant) => / ON (`[^`]+`|\*)\.\* /.test(grant) && /ALL PRIVILEGES|UPDATE|DELETE/.test(grant));
  if (wide.length > 0) {
    log.warn(
      { tables: appendOnlyTables },
      'the application has rights on the whole database: only triggers keep these tables from being changed',
    );
  }
}

import { drizzle } from 'drizzle-orm/mysql2';
import { migrate as runMigrations } from 'drizzle-orm/mysql2/migrator';
import mysql, { type Connection, type RowDataPacket } from 'mysql2/promise';
import { connectionOptions } from './client';
import { underLease } from './lease';

/** Tables that the application may only add to. The triggers of the migrations refuse it once more. */
export const appendOnlyTables = [
  'audit',
  'edition_events',
  'editions',
  'mapping_versions',
  'reading_acts',
  'resolved_editions',
] as const;
/** Stored bytes never change either; only whoever resets the database removes them. */
const insertOnlyTables: readonly string[] = [...appendOnlyTables, 'files'];
const ownersTables: readonly string[] = ['__drizzle_migrations', 'leases'];

interface MigrateOptions {
  /** The database's owner. */
  ownerUrl: string;
  /** The application's user, whose rights are renewed; the owner itself where there is no other. */
  applicationUrl: string;
  folder: string;
  /** Names this server in the lease. */
  owner: string;
}

/** Brings the database to the newest schema, one server at a time. */
export async function migrate({ ownerUrl, applicationUrl, folder, owner }: MigrateOptions): Promise<void> {
  const connection = await mysql.createConnection(connectionOptions(ownerUrl));
  try {
    // DDL commits by itself and the lease is renewed meanwhile, so it gets a connection of its own.
    const leaseConnection = await mysql.createConnection(connectionOptions(ownerUrl));
    try {
      await underLease(
        leaseConnection,
        { name: 'migration', owner, leaseSeconds: 60, waitSeconds: 120 },
        async () => {
          await runMigrations(drizzle(connection), { migrationsFolder: folder });
          await renewRights(connection, applicationUrl);
        },
      );
    } finally {
      await leaseConnection.end();
    }
  } finally {
    await connection.end();
  }
}

/** Table by table, so that a table added later is not forgotten and a sealed one never gets more. */
async function renewRights(connection: Connection, applicationUrl: string): Promise<void> {
  const [accounts] = await connection.query<RowDataPacket[]>('SELECT CURRENT_USER() AS account');
  const owner = String(accounts[0]?.account ?? '');
  const application = await accountOf(applicationUrl);
  if (application === owner) return;
  const grantee = application
    .split('@')
    .map((part) => mysql.escape(part))
    .join('@');
  const [tables] = await connection.query<RowDataPacket[]>(
    "SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE'",
  );
  for (const table of tables.map((row) => String(row.name))) {
    const quoted = mysql.escapeId(table);
    if (ownersTables.includes(table)) {
      await connection.query(`GRANT SELECT ON ${quoted} TO ${grantee}`);
    } else if (insertOnlyTables.includes(table)) {
      // Granted first: revoking from an account without any right on the table is an error.
      await connection.query(`GRANT SELECT, INSERT ON ${quoted} TO ${grantee}`);
      await connection.query(`REVOKE UPDATE, DELETE ON ${quoted} FROM ${grantee}`);
    } else {
      await connection.query(`GRANT SELECT, INSERT, UPDATE, DELETE ON ${quoted} TO ${grantee}`);
    }
  }
}

/** `user@host` as the server matched it, which may be a pattern. */
async function accountOf(url: string): Promise<string> {
  const { database: _, ...options } = connectionOptions(url);
  const connection = await mysql.createConnection(options);
  try {
    const [rows] = await connection.query<RowDataPacket[]>('SELECT CURRENT_USER() AS account');
    return String(rows[0]?.account ?? '');
  } finally {
    await connection.end();
  }
}

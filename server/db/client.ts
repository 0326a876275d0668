import type { ExtractTablesWithRelations } from 'drizzle-orm';
import type { MySqlDatabase } from 'drizzle-orm/mysql-core';
import { drizzle, type MySql2PreparedQueryHKT, type MySql2QueryResultHKT } from 'drizzle-orm/mysql2';
import mysql from 'mysql2/promise';
import * as checks from './schema/checks';
import * as files from './schema/files';
import * as learning from './schema/learning';
import * as mappings from './schema/mappings';
import * as people from './schema/people';
import * as projects from './schema/projects';
import * as returns from './schema/returns';
import * as ruleSets from './schema/rule-sets';
import * as submittals from './schema/submittals';
import * as work from './schema/work';

export const schema = {
  ...checks,
  ...files,
  ...learning,
  ...mappings,
  ...people,
  ...projects,
  ...returns,
  ...ruleSets,
  ...submittals,
  ...work,
};

/**
 * The pool or a transaction of it: queries and commands take either and the caller decides. A transaction
 * inside a transaction is a savepoint.
 */
export type Database = MySqlDatabase<
  MySql2QueryResultHKT,
  MySql2PreparedQueryHKT,
  typeof schema,
  ExtractTablesWithRelations<typeof schema>
>;

export function connect(url: string, { connections = 10 } = {}) {
  const pool = mysql.createPool({
    ...connectionOptions(url),
    connectionLimit: connections,
    maxIdle: connections,
    enableKeepAlive: true,
  });
  const db: Database = drizzle(pool, { schema, mode: 'planetscale' });
  return { db, pool, close: () => pool.end() };
}

export function connectionOptions(url: string): mysql.ConnectionOptions {
  const parsed = new URL(url);
  const socketPath = parsed.searchParams.get('socketPath');
  return {
    ...(socketPath ? { socketPath } : { host: parsed.hostname, port: Number(parsed.port || 3306) }),
    user: decodeURIComponent(parsed.username),
    password: decodeURIComponent(parsed.password),
    database: decodeURIComponent(parsed.pathname.slice(1)),
    timezone: 'Z',
    charset: 'utf8mb4',
    supportBigNumbers: true,
    jsonStrings: true,
    ssl: parsed.searchParams.get('tls') === 'yes' ? {} : undefined,
  };
}

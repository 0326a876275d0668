import { drizzle, type MySql2Database } from 'drizzle-orm/mysql2';
import mysql from 'mysql2/promise';
import * as checks from './schema/checks';
import * as files from './schema/files';
import * as people from './schema/people';
import * as projects from './schema/projects';
import * as returns from './schema/returns';
import * as ruleSets from './schema/rule-sets';
import * as submittals from './schema/submittals';
import * as work from './schema/work';

export const schema = {
  ...checks,
  ...files,
  ...people,
  ...projects,
  ...returns,
  ...ruleSets,
  ...submittals,
  ...work,
};

export type Database = MySql2Database<typeof schema>;
/** Either the pool or a transaction: queries take this and the caller decides. */
export type Queryable = Database | Parameters<Parameters<Database['transaction']>[0]>[0];
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

export function connect(url: string, { connections = 10 } = {}) {
  const pool = mysql.createPool({
    ...connectionOptions(url),
    connectionLimit: connections,
    maxIdle: connections,
    enableKeepAlive: true,
  });
  // mysql2's pool is what the drizzle driver wraps; its callback form serves stores that want one.
  const db = drizzle(pool, { schema, mode: 'planetscale' });
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

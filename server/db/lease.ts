import { setTimeout as sleep } from 'node:timers/promises';
import type { Connection, ResultSetHeader } from 'mysql2/promise';

interface LeaseOptions {
  /** What is leased: `migration`. */
  name: string;
  /** Who asks; the same owner may ask again. */
  owner: string;
  leaseSeconds: number;
  waitSeconds: number;
}

/**
 * Runs work under a lease row that several servers compete for. The claim is a committed conditional
 * update by the database's clock, so that it holds on a cluster too, where named locks are local to a node.
 * The table is made here because migrations themselves need it.
 */
export async function underLease<Result>(
  connection: Connection,
  { name, owner, leaseSeconds, waitSeconds }: LeaseOptions,
  work: () => Promise<Result>,
): Promise<Result> {
  await prepareLease(connection, name);
  const deadline = Date.now() + waitSeconds * 1000;
  while (!(await claimLease(connection, { name, owner, leaseSeconds }))) {
    if (Date.now() > deadline) throw new Error(`The lease "${name}" is held by another server.`);
    await sleep(200);
  }
  const renewal = setInterval(() => {
    claimLease(connection, { name, owner, leaseSeconds }).catch(() => undefined);
  }, leaseSeconds * 400);
  try {
    return await work();
  } finally {
    clearInterval(renewal);
    await connection.query(
      'UPDATE leases SET owner = NULL, lease_until = NULL WHERE name = ? AND owner = ?',
      [name, owner],
    );
  }
}

export async function prepareLease(connection: Connection, name: string): Promise<void> {
  await connection.query(
    `CREATE TABLE IF NOT EXISTS leases (
       name varchar(60) character set ascii collate ascii_bin NOT NULL PRIMARY KEY,
       owner varchar(60) NULL, lease_until datetime(3) NULL)`,
  );
  await connection.query('INSERT IGNORE INTO leases (name) VALUES (?)', [name]);
}

export async function claimLease(
  connection: Connection,
  { name, owner, leaseSeconds }: Omit<LeaseOptions, 'waitSeconds'>,
): Promise<boolean> {
  const [result] = await connection.query<ResultSetHeader>(
    `UPDATE leases SET owner = ?, lease_until = UTC_TIMESTAMP(3) + INTERVAL ? SECOND
     WHERE name = ? AND (owner IS NULL OR owner = ? OR lease_until < UTC_TIMESTAMP(3))`,
    [owner, leaseSeconds, name, owner],
  );
  return result.affectedRows === 1;
}

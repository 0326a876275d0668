import path from 'node:path';
import mysql, { type Connection, type RowDataPacket } from 'mysql2/promise';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { connectionOptions } from '#server/db/client';
import { claimLease, prepareLease, underLease } from '#server/db/lease';
import { appendOnlyTables, migrate } from '#server/db/migrate';
import { seedOrganisations } from '#server/db/seed/seed-organisations';
import { seedProjects } from '#server/db/seed/seed-projects';
import { seedRuleSets } from '#server/db/seed/seed-rule-sets';
import { writeAudit } from '#server/db/write-audit';
import { newId } from '#server/deps';
import { createTestDatabase, type TestDatabase } from './harness/test-database';

let database: TestDatabase;
let owner: Connection;
let application: Connection;

beforeAll(async () => {
  database = await createTestDatabase();
  owner = await mysql.createConnection(connectionOptions(database.ownerUrl));
  application = await mysql.createConnection(connectionOptions(database.applicationUrl));
  await database.connection.db.transaction(async (tx) => {
    await seedOrganisations(tx);
    await seedRuleSets(tx);
    await seedProjects(tx);
    const entry = { actor: null, act: 'seeded', subject: { kind: 'demo', id: 'demo' }, requestId: null };
    await writeAudit(tx, { now: () => new Date(), newId }, entry);
  });
  await owner.query('SET FOREIGN_KEY_CHECKS = 0');
  const [one, at] = [newId(), '2026-03-09 09:00:00'];
  await owner.query(
    `INSERT INTO mapping_versions
       (id, mapping_id, organisation_id, number, document, fingerprint, origin, learned, person_id, at)
     VALUES (?, ?, ?, 1, '{}', '', 'Imported', '[]', ?, ?)`,
    [one, one, one, one, at],
  );
  await owner.query(
    `INSERT INTO reading_acts (id, revision_id, contractor_id, act, person_id, at) VALUES (?, ?, ?, '{}', ?, ?)`,
    [one, one, one, one, at],
  );
  await owner.query('SET FOREIGN_KEY_CHECKS = 1');
});

afterAll(async () => {
  await owner.end();
  await application.end();
  await database.drop();
});

/** Each way to change what is there, or to do away with what prevents it. */
const attempts = (table: string, column: string): [string, string][] => [
  ['UPDATE', `UPDATE ${table} SET ${column} = ${column}`],
  ['UPDATE to another value', `UPDATE ${table} SET ${column} = REVERSE(${column})`],
  ['DELETE', `DELETE FROM ${table}`],
  ['REPLACE', `REPLACE INTO ${table} SELECT * FROM ${table}`],
  [
    'INSERT … ON DUPLICATE KEY UPDATE',
    `INSERT INTO ${table} SELECT * FROM ${table} ON DUPLICATE KEY UPDATE ${column} = VALUES(${column})`,
  ],
];

describe.each(appendOnlyTables)('%s', (table) => {
  const column = table === 'resolved_editions' ? 'hash' : 'id';

  it.each(attempts(table, column))('takes no %s from the application', async (_name, statement) => {
    await expect(application.query(statement)).rejects.toMatchObject({ errno: 1142 });
  });

  it.each(attempts(table, column))('takes no %s from its owner either', async (_name, statement) => {
    await expect(owner.query(statement)).rejects.toMatchObject({ sqlState: '45000' });
  });

  it.each([
    ['TRUNCATE', `TRUNCATE ${table}`],
    ['DROP', `DROP TABLE ${table}`],
    ['ALTER', `ALTER TABLE ${table} ADD COLUMN more int`],
    ['DROP TRIGGER', `DROP TRIGGER ${table}_no_update`],
    ['a trigger of its own', `CREATE TRIGGER mine BEFORE INSERT ON ${table} FOR EACH ROW SET @x = 1`],
    ['GRANT', `GRANT UPDATE ON ${table} TO CURRENT_USER()`],
  ])('does not let the application %s', async (_name, statement) => {
    await expect(application.query(statement)).rejects.toMatchObject({ errno: expect.any(Number) });
  });

  it('takes INSERT and SELECT from the application, and holds what was put in', async () => {
    const [rows] = await application.query<RowDataPacket[]>(`SELECT COUNT(*) AS total FROM ${table}`);
    expect(rows[0]?.total).toBeGreaterThan(0);
  });

  it('refuses again after the rights were widened and the migrations ran', async () => {
    const account = "'application'@'localhost'";
    await owner.query(`GRANT UPDATE, DELETE ON ${table} TO ${account}`);
    await migrateAgain();
    const fresh = await mysql.createConnection(connectionOptions(database.applicationUrl));
    await expect(fresh.query(`DELETE FROM ${table}`)).rejects.toMatchObject({ errno: 1142 });
    await fresh.end();
  });
});

function migrateAgain() {
  return migrate({
    ownerUrl: database.ownerUrl,
    applicationUrl: database.applicationUrl,
    folder: path.resolve('drizzle'),
    owner: newId(),
  });
}

describe('migrating', () => {
  it('takes turns where several servers start at once on an empty database', async () => {
    const empty = await createTestDatabase({ migrated: false });
    const options = {
      ownerUrl: empty.ownerUrl,
      applicationUrl: empty.applicationUrl,
      folder: path.resolve('drizzle'),
    };
    await Promise.all([1, 2, 3].map((server) => migrate({ ...options, owner: `server-${server}` })));
    const connection = await mysql.createConnection(connectionOptions(empty.ownerUrl));
    const [rows] = await connection.query<RowDataPacket[]>('SELECT hash FROM __drizzle_migrations');
    expect(rows.length).toBe(new Set(rows.map((row) => row.hash)).size);
    await connection.end();
    await empty.drop();
  });

  it('gives every foreign key and index a name that MariaDB takes as it stands', async () => {
    const [rows] = await owner.query<RowDataPacket[]>(
      `SELECT constraint_name AS name FROM information_schema.referential_constraints
       WHERE constraint_schema = DATABASE()`,
    );
    expect(rows.length).toBeGreaterThan(50);
    for (const row of rows) expect(row.name).toMatch(/_fk$/);
  });
});

describe('a lease', () => {
  it('is held by one owner until it is given back', async () => {
    const events: string[] = [];
    const lease = { name: 'turns', leaseSeconds: 30, waitSeconds: 10 };
    const second = await mysql.createConnection(connectionOptions(database.ownerUrl));
    const turn = (connection: Connection, who: string) =>
      underLease(connection, { ...lease, owner: who }, async () => {
        events.push(`${who} begins`);
        await new Promise((resolve) => setTimeout(resolve, 100));
        events.push(`${who} ends`);
      });
    await Promise.all([turn(owner, 'first'), turn(second, 'second')]);
    expect(events[0]?.split(' ')[0]).toBe(events[1]?.split(' ')[0]);
    expect(events[2]?.split(' ')[0]).toBe(events[3]?.split(' ')[0]);
    await second.end();
  });

  it('is taken over once it has expired, not before', async () => {
    await prepareLease(owner, 'left behind');
    const claim = (who: string) => claimLease(owner, { name: 'left behind', owner: who, leaseSeconds: 60 });
    expect(await claim('first')).toBe(true);
    expect(await claim('second')).toBe(false);
    await owner.query(
      "UPDATE leases SET lease_until = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND WHERE name = 'left behind'",
    );
    expect(await claim('second')).toBe(true);
    expect(await claim('first')).toBe(false);
  });
});

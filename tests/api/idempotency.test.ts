import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { audit, laboratories } from '#server/db/schema/people';
import { idempotencyKeys } from '#server/db/schema/work';
import { aSignedIn, makeMember, makeOrganisation } from './harness/organisations';
import { startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;
let contractor: { id: string; name: string };
let technician: Awaited<ReturnType<typeof aSignedIn>>;

beforeAll(async () => {
  test = await startTestApp();
  contractor = await makeOrganisation(test, { name: 'Penstock Paving', kind: 'contractor' });
  technician = await aSignedIn(test, { organisation: contractor, roles: ['laboratory'] });
});

afterAll(() => test.close());

const add = (name: string, key: string, person = technician) =>
  person.post('/api/laboratories').set('Idempotency-Key', key).send({ name, accreditation: null });

const named = (name: string) => test.deps.db.select().from(laboratories).where(eq(laboratories.name, name));

describe('an act with an idempotency key', () => {
  it('happens once for its key, and each repeat gets the first answer', async () => {
    const first = await add('Once', 'key-of-once').expect(201);
    const second = await add('Once', 'key-of-once').expect(201);
    expect(second.text).toBe(first.text);
    expect(await named('Once')).toHaveLength(1);
    const entries = await test.deps.db.select().from(audit).where(eq(audit.subjectId, first.body.id));
    expect(entries).toHaveLength(1);
  });

  it('happens once where both clicks arrive at the same time', async () => {
    const answers = await Promise.all(Array.from({ length: 4 }, () => add('Double', 'key-of-double')));
    const statuses = answers.map(({ status }) => status);
    expect(statuses).toContain(201);
    expect(statuses.every((status) => status === 201 || status === 409)).toBe(true);
    expect(await named('Double')).toHaveLength(1);
    const waiting = answers.find(({ status }) => status === 409);
    if (waiting) expect(waiting.get('Retry-After')).toBe('2');
  });

  it('refuses its key for another request', async () => {
    await add('Mine', 'key-of-mine').expect(201);
    const answer = await add('Another', 'key-of-mine').expect(422);
    expect(answer.body.type).toBe('/problems/key-reused');
    expect(await named('Another')).toEqual([]);
  });

  it('needs a key of at least eight printable characters', async () => {
    for (const key of ['', 'short', 'with a space in it', 'x'.repeat(121)]) {
      const answer = await add('Keyless', key);
      expect(answer.body.type).toBe('/problems/key-missing');
    }
    await add('Keyed', 'x'.repeat(8)).expect(201);
  });

  it('may be tried again under its key after a failure', async () => {
    await add('Taken', 'key-of-taken').expect(201);
    await add('Taken', 'key-of-second').expect(409);
    await test.deps.db.delete(laboratories).where(eq(laboratories.name, 'Taken'));
    await add('Taken', 'key-of-second').expect(201);
  });

  it('belongs to one person acting for one organisation', async () => {
    const other = await aSignedIn(test, { organisation: contractor, roles: ['laboratory'] });
    await add('Of the first', 'the-same-key').expect(201);
    await add('Of the second', 'the-same-key', other).expect(201);
    const elsewhere = await makeOrganisation(test, { name: 'Second Paving', kind: 'contractor' });
    await makeMember(test, {
      organisationId: elsewhere.id,
      personId: technician.personId,
      roles: ['laboratory'],
    });
    await technician.put('/api/session/organisation').send({ organisationId: elsewhere.id }).expect(200);
    await add('Of the first', 'the-same-key').expect(201);
    expect(await named('Of the first')).toHaveLength(2);
    await technician.put('/api/session/organisation').send({ organisationId: contractor.id }).expect(200);
  });

  it('whose server died before the answer waits for the lease, then happens', async () => {
    await add('Interrupted', 'key-of-interrupted').expect(201);
    await test.deps.db.delete(laboratories).where(eq(laboratories.name, 'Interrupted'));
    const left = (lease: string) =>
      test.deps.db
        .update(idempotencyKeys)
        .set({
          status: null,
          response: null,
          owner: test.deps.newId(),
          leaseUntil: sql`utc_timestamp(3) + interval ${sql.raw(lease)} second`,
        })
        .where(eq(idempotencyKeys.requestHash, hash));
    const keys = await test.deps.db.select().from(idempotencyKeys);
    const hash = keys.sort((a, b) => b.id.localeCompare(a.id))[0]?.requestHash ?? '';
    await left('30');
    await add('Interrupted', 'key-of-interrupted').expect(409);
    await left('-1');
    await add('Interrupted', 'key-of-interrupted').expect(201);
    expect(await named('Interrupted')).toHaveLength(1);
  });
});

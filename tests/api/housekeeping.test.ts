import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { sessions } from '#server/db/schema/people';
import { idempotencyKeys, rateLimits } from '#server/db/schema/work';
import { removeExpired } from '#server/jobs/housekeeping';
import { aSignedIn, makeOrganisation } from './harness/organisations';
import { startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;

beforeAll(async () => {
  test = await startTestApp();
});

afterAll(() => test.close());

it('removes what has expired and keeps what holds', async () => {
  const contractor = await makeOrganisation(test, { name: 'Penstock Paving', kind: 'contractor' });
  const person = await aSignedIn(test, { organisation: contractor, roles: ['laboratory'] });
  const add = (name: string) =>
    person.post('/api/laboratories').send({ name, accreditation: null }).expect(201);
  await add('First');
  const now = test.clock.now;
  await test.deps.db.update(idempotencyKeys).set({ createdAt: new Date(now.getTime() - 48 * 3600 * 1000) });
  await removeExpired(test.deps.db, now);
  expect(await test.deps.db.select().from(idempotencyKeys)).toHaveLength(1);
  await removeExpired(test.deps.db, new Date(now.getTime() + 1));
  expect(await test.deps.db.select().from(idempotencyKeys)).toEqual([]);

  const session = () => test.deps.db.select().from(sessions).where(eq(sessions.personId, person.personId));
  const [held] = await session();
  const expiresAt = held?.expiresAt ?? now;
  await removeExpired(test.deps.db, expiresAt);
  expect(await session()).toHaveLength(1);
  expect(await test.deps.db.select().from(rateLimits)).toEqual([]);
  await removeExpired(test.deps.db, new Date(expiresAt.getTime() + 1));
  expect(await session()).toEqual([]);
});

import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { makeSetUpLink } from '#server/commands/make-set-up-link';
import { organisations, people, setUpLinks } from '#server/db/schema/people';
import { editions } from '#server/db/schema/rule-sets';
import { password } from './harness/organisations';
import { browser, startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;

beforeEach(async () => {
  test = await startTestApp();
});

afterEach(() => test.close());

const agency = {
  agencyName: 'Larkmoor Roads',
  timeZone: 'Europe/London',
  reviewWorkingDays: 10,
  name: 'Edith Moss',
  email: 'edith@larkmoor.example',
  password,
};

async function link(): Promise<string> {
  const made = await makeSetUpLink(test.deps);
  return made?.split('/').at(-1) ?? '';
}

describe('the first day', () => {
  it('makes the agency and its administrator, and signs them in', async () => {
    const token = await link();
    const first = browser(test.app);
    expect((await first.get('/api/sign-in-options')).body).toEqual({ demoPeople: [], setUpNeeded: true });
    await first.get(`/api/set-up/${token}`).expect(200, { holds: true });
    const { body } = await first.post(`/api/set-up/${token}`).send(agency).expect(201);
    expect(body.active).toMatchObject({ organisationName: agency.agencyName, roles: ['administrator'] });
    expect((await first.get('/api/organisation')).body).toMatchObject({
      kind: 'agency',
      timeZone: 'Europe/London',
      reviewWorkingDays: 10,
      waiverPolicy: 'advisory',
    });
    expect((await first.get('/api/sign-in-options')).body.setUpNeeded).toBe(false);
    const published = await test.deps.db.select().from(editions);
    expect(published.length).toBeGreaterThan(0);
    for (const { startingPoint, secondAuthorId } of published) {
      expect({ startingPoint, secondAuthorId }).toEqual({ startingPoint: true, secondAuthorId: null });
    }
  });

  it('uses its link once', async () => {
    const token = await link();
    await browser(test.app).post(`/api/set-up/${token}`).send(agency).expect(201);
    const again = await browser(test.app)
      .post(`/api/set-up/${token}`)
      .send({ ...agency, email: 'second@larkmoor.example' });
    expect(again.status).toBe(410);
    await browser(test.app).get(`/api/set-up/${token}`).expect(410);
    expect(await test.deps.db.select().from(organisations)).toHaveLength(1);
  });

  it('makes one agency where two people open the link at the same time', async () => {
    const token = await link();
    const answers = await Promise.all([
      browser(test.app).post(`/api/set-up/${token}`).send(agency),
      browser(test.app)
        .post(`/api/set-up/${token}`)
        .send({ ...agency, email: 'second@larkmoor.example' }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 410]);
    expect(await test.deps.db.select().from(organisations)).toHaveLength(1);
    expect(await test.deps.db.select().from(people)).toHaveLength(1);
  });

  it('keeps the link as a hash, and ends an older link with each start', async () => {
    const older = await link();
    const newer = await link();
    const rows = await test.deps.db.select().from(setUpLinks);
    expect(rows).toHaveLength(1);
    expect(JSON.stringify(rows)).not.toContain(newer);
    await browser(test.app).get(`/api/set-up/${older}`).expect(410);
    await browser(test.app).get(`/api/set-up/${newer}`).expect(200);
  });

  it('prints no link once there is an organisation', async () => {
    const token = await link();
    await browser(test.app).post(`/api/set-up/${token}`).send(agency).expect(201);
    expect(await makeSetUpLink(test.deps)).toBeNull();
  });

  it('leaves the link usable where the form was wrong', async () => {
    const token = await link();
    const wrong = await browser(test.app)
      .post(`/api/set-up/${token}`)
      .send({ ...agency, timeZone: 'Nowhere/None' });
    expect(wrong.status).toBe(422);
    expect(wrong.body.errors[0].pointer).toBe('/timeZone');
    await browser(test.app).post(`/api/set-up/${token}`).send(agency).expect(201);
  });
});

import { eq } from 'drizzle-orm';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sessions } from '#server/db/schema/people';
import { outbox } from '#server/db/schema/work';
import {
  aSignedIn,
  makeMember,
  makeOrganisation,
  makePerson,
  password,
  signIn,
} from './harness/organisations';
import { browser, origin, startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;
let agency: { id: string; name: string };
let contractor: { id: string; name: string };

beforeAll(async () => {
  test = await startTestApp();
  agency = await makeOrganisation(test, { name: 'Larkmoor Roads', kind: 'agency' });
  contractor = await makeOrganisation(test, { name: 'Penstock Paving', kind: 'contractor' });
});

afterAll(() => test.close());

describe('signing in', () => {
  it('signs in with the right password and acts for the only organisation', async () => {
    const reviewer = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const { body } = await reviewer.get('/api/session').expect(200);
    expect(body.active).toEqual({
      organisationId: agency.id,
      organisationName: agency.name,
      kind: 'agency',
      roles: ['reviewer'],
    });
    expect(body.abilities).toMatchObject({ seeQueue: true, upload: false, managePeople: false });
  });
});

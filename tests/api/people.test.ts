import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { audit, invitations, members, people } from '#server/db/schema/people';
import { outbox } from '#server/db/schema/work';
import {
  aSignedIn,
  makeOrganisation,
  makePerson,
  password,
  signIn,
  tieContractor,
} from './harness/organisations';
import { expectSameAsAbsent } from './harness/same-as-absent';
import { browser, startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;
let agency: { id: string; name: string };
let contractor: { id: string; name: string };
let other: { id: string; name: string };
let administrator: Awaited<ReturnType<typeof aSignedIn>>;
let stranger: Awaited<ReturnType<typeof aSignedIn>>;

beforeAll(async () => {
  test = await startTestApp();
  agency = await makeOrganisation(test, { name: 'Larkmoor Roads', kind: 'agency' });
  contractor = await makeOrganisation(test, { name: 'Penstock Paving', kind: 'contractor' });
  other = await makeOrganisation(test, { name: 'Elsewhere Roads', kind: 'agency' });
  await tieContractor(test, { agencyId: agency.id, contractorId: contractor.id });
  administrator = await aSignedIn(test, { organisation: agency, roles: ['administrator'] });
  stranger = await aSignedIn(test, { organisation: other, roles: ['administrator'] });
});

afterAll(() => test.close());

const invitationFor = (email: string) => ({ name: 'Invited Person', email, roles: ['reviewer'] });

async function tokenFor(email: string): Promise<string> {
  const mails = await test.deps.db.select().from(outbox).where(eq(outbox.kind, 'invitation'));
  const mail = mails.find(({ recipients }) => recipients.some((recipient) => recipient.email === email));
  return /\/invitations\/([^\s"<]+)/.exec(mail?.text ?? '')?.[1] ?? '';
}

async function invite(email: string, roles: string[] = ['reviewer']): Promise<string> {
  await administrator
    .post('/api/invitations')
    .send({ ...invitationFor(email), roles })
    .expect(201);
  return tokenFor(email);
}

describe('the people of an organisation', () => {
  it('are listed to everybody in it, and open invitations to its administrator', async () => {
    const reviewer = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    await invite('listed@larkmoor.example');
    const seen = (await reviewer.get('/api/people').expect(200)).body;
    expect(seen.people.map(({ personId }: { personId: string }) => personId)).toContain(reviewer.personId);
    expect(seen.people.map(({ personId }: { personId: string }) => personId)).not.toContain(
      stranger.personId,
    );
    expect(seen.invitations).toEqual([]);
    const managed = (await administrator.get('/api/people')).body;
    expect(managed.invitations).toEqual([
      expect.objectContaining({ email: 'listed@larkmoor.example', mail: 'waiting' }),
    ]);
  });

  it('change their roles by an administrator alone, and what was there is written down', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const address = `/api/people/${person.membershipId}`;
    const roles = ['reviewer', 'signing engineer'];
    await person.patch(address).set('If-Match', '"1"').send({ roles }).expect(403);
    const { body } = await administrator.patch(address).set('If-Match', '"1"').send({ roles }).expect(200);
    expect(body).toMatchObject({ roles, version: 2 });
    const entries = await test.deps.db.select().from(audit).where(eq(audit.subjectId, person.personId));
    expect(entries).toEqual([
      expect.objectContaining({ act: 'roles changed', detail: { from: ['reviewer'], to: roles } }),
    ]);
  });

  it('are not changed on a version that has passed; the answer shows the present one', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const address = `/api/people/${person.membershipId}`;
    await administrator
      .patch(address)
      .set('If-Match', '"1"')
      .send({ roles: ['rule author'] })
      .expect(200);
    const stale = await administrator
      .patch(address)
      .set('If-Match', '"1"')
      .send({ roles: ['laboratory'] });
    expect(stale.status).toBe(412);
    expect(stale.body.present).toMatchObject({ roles: ['rule author'], version: 2 });
  });

  it('cannot hold a role of the other side', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const answer = await administrator
      .patch(`/api/people/${person.membershipId}`)
      .set('If-Match', '"1"')
      .send({ roles: ['quality manager'] });
    expect(answer.status).toBe(422);
  });

  it('lose the organisation at once when they are taken out of it', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    await person.get('/api/people').expect(200);
    await administrator.delete(`/api/people/${person.membershipId}`).set('If-Match', '"1"').expect(204);
    expect((await person.get('/api/people')).body.type).toBe('/problems/no-organisation');
    const kept = await test.deps.db.select().from(people).where(eq(people.id, person.personId));
    expect(kept).toHaveLength(1);
  });

  it('keep at least one administrator', async () => {
    const alone = await makeOrganisation(test, { name: 'Alone', kind: 'contractor' });
    const only = await aSignedIn(test, { organisation: alone, roles: ['administrator'] });
    const address = `/api/people/${only.membershipId}`;
    const roles = ['laboratory'];
    await only.patch(address).set('If-Match', '"1"').send({ roles }).expect(409);
    await only.delete(address).set('If-Match', '"1"').expect(409);
    const [row] = await test.deps.db.select().from(members).where(eq(members.id, only.membershipId));
    expect(row?.role).toBe('administrator');
  });

  it('of another organisation are not there', async () => {
    const path = (id: string) => `/api/people/${id}`;
    const theirs = stranger.membershipId;
    const body = { roles: ['reviewer'] };
    await expectSameAsAbsent(administrator, theirs, { method: 'patch', path, body, version: 1 });
    await expectSameAsAbsent(administrator, theirs, { method: 'delete', path, version: 1 });
  });
});

describe('an invitation', () => {
  it('makes a person with a password, a membership and a session', async () => {
    const token = await invite('new@larkmoor.example', ['reviewer', 'laboratory']);
    const newcomer = browser(test.app);
    const offer = await newcomer.get(`/api/invitation-links/${token}`).expect(200);
    expect(offer.body).toEqual({
      organisation: agency.name,
      kind: 'agency',
      name: 'Invited Person',
      email: 'new@larkmoor.example',
      roles: ['laboratory', 'reviewer'],
      known: false,
    });
    const accepted = await newcomer
      .post(`/api/invitation-links/${token}`)
      .send({ name: 'Orla Finch', password })
      .expect(201);
    expect(accepted.body.active).toMatchObject({ organisationId: agency.id });
    expect((await newcomer.get('/api/session')).body.person.name).toBe('Orla Finch');
    const again = await browser(test.app)
      .post(`/api/invitation-links/${token}`)
      .send({ name: 'Somebody Else', password });
    expect(again.status).toBe(410);
  });

  it('asks somebody who is known for their own password', async () => {
    await makePerson(test, { name: 'Known', email: 'known@penstock.example' });
    const token = await invite('known@penstock.example');
    const visitor = browser(test.app);
    expect((await visitor.get(`/api/invitation-links/${token}`)).body.known).toBe(true);
    const wrong = { name: 'Known', password: 'not their password' };
    await visitor.post(`/api/invitation-links/${token}`).send(wrong).expect(401);
    await visitor.post(`/api/invitation-links/${token}`).send({ name: 'Known', password }).expect(201);
    expect((await visitor.get('/api/session')).body.active.organisationId).toBe(agency.id);
  });

  it('keeps its token in the mail alone', async () => {
    const token = await invite('secret@larkmoor.example');
    const [row] = await test.deps.db
      .select()
      .from(invitations)
      .where(eq(invitations.email, 'secret@larkmoor.example'));
    expect(JSON.stringify(row)).not.toContain(token);
  });

  it('holds for seven days and not an instant longer', async () => {
    const token = await invite('late@larkmoor.example');
    const start = test.clock.now;
    const sevenDays = start.getTime() + 7 * 24 * 3600 * 1000;
    test.clock.now = new Date(sevenDays - 1);
    await browser(test.app).get(`/api/invitation-links/${token}`).expect(200);
    test.clock.now = new Date(sevenDays);
    await browser(test.app).get(`/api/invitation-links/${token}`).expect(410);
    test.clock.now = start;
  });

  it('stops working when it is withdrawn', async () => {
    const token = await invite('withdrawn@larkmoor.example');
    const [row] = await test.deps.db
      .select()
      .from(invitations)
      .where(eq(invitations.email, 'withdrawn@larkmoor.example'));
    await administrator.delete(`/api/invitations/${row?.id}`).set('If-Match', '"1"').expect(204);
    await browser(test.app).get(`/api/invitation-links/${token}`).expect(410);
  });

  it('of another organisation is not there to withdraw', async () => {
    await invite('theirs@larkmoor.example');
    const [row] = await test.deps.db
      .select()
      .from(invitations)
      .where(eq(invitations.email, 'theirs@larkmoor.example'));
    const path = (id: string) => `/api/invitations/${id}`;
    await expectSameAsAbsent(stranger, row?.id ?? '', { method: 'delete', path, version: 1 });
  });

  it('is not withdrawn by somebody who saw an older one, who is shown the present one', async () => {
    await invite('stale@larkmoor.example');
    const [row] = await test.deps.db
      .update(invitations)
      .set({ version: 2 })
      .where(eq(invitations.email, 'stale@larkmoor.example'))
      .then(() =>
        test.deps.db.select().from(invitations).where(eq(invitations.email, 'stale@larkmoor.example')),
      );
    const answer = await administrator.delete(`/api/invitations/${row?.id}`).set('If-Match', '"1"');
    expect(answer.status).toBe(412);
    expect(answer.body.present).toMatchObject({ email: 'stale@larkmoor.example', version: 2 });
    await administrator.delete(`/api/invitations/${row?.id}`).set('If-Match', '"2"').expect(204);
  });

  it('is made by an administrator alone', async () => {
    for (const roles of [['reviewer'], ['signing engineer'], ['rule author'], ['laboratory']] as const) {
      const person = await aSignedIn(test, { organisation: agency, roles: [...roles] });
      await person.post('/api/invitations').send(invitationFor('no@larkmoor.example')).expect(403);
    }
  });

  it('is not sent twice to one address', async () => {
    await invite('twice@larkmoor.example');
    const again = await administrator.post('/api/invitations').send(invitationFor('Twice@Larkmoor.example'));
    expect(again.body.type).toBe('/problems/already-exists');
  });

  it('reaches the first administrator of a contractor, and nobody after that', async () => {
    const invitation = {
      name: 'Contractor Administrator',
      email: 'first@penstock.example',
      roles: ['administrator'],
      contractorId: contractor.id,
    };
    const asReviewer = await administrator
      .post('/api/invitations')
      .send({ ...invitation, roles: ['quality manager'] });
    expect(asReviewer.status).toBe(422);
    const { body } = await administrator.post('/api/invitations').send(invitation).expect(201);
    expect(body.organisation).toBe(contractor.name);
    const token = await tokenFor('first@penstock.example');
    const first = browser(test.app);
    await first.post(`/api/invitation-links/${token}`).send({ name: 'First', password }).expect(201);
    const second = await administrator
      .post('/api/invitations')
      .send({ ...invitation, email: 'second@penstock.example' });
    expect(second.body.type).toBe('/problems/wrong-state');
  });

  it('into a contractor of another agency answers as into none', async () => {
    const contractorId = contractor.id;
    const send = (id: string) =>
      stranger
        .post('/api/invitations')
        .set('X-Request-Id', 'one-number-for-both')
        .send({ ...invitationFor('x@y.example'), roles: ['administrator'], contractorId: id });
    const foreign = await send(contractorId);
    const absent = await send('0197a0a0-0000-7000-8000-00000000dead');
    expect(foreign.status).toBe(404);
    expect(foreign.text).toBe(absent.text);
  });
});

describe('contractors and laboratories', () => {
  it('a contractor is added with an invitation to its administrator', async () => {
    const { body } = await administrator
      .post('/api/contractors')
      .send({ name: 'Gorse Hill Roads', administrator: { name: 'Ada', email: 'ada@gorse.example' } })
      .expect(201);
    expect(body).toMatchObject({ name: 'Gorse Hill Roads', joined: false, invited: true });
    const listed = (await administrator.get('/api/contractors').expect(200)).body.contractors;
    expect(listed).toContainEqual(body);
    expect(await tokenFor('ada@gorse.example')).not.toBe('');
    expect((await stranger.get('/api/contractors')).body.contractors).toEqual([]);
  });

  it('a contractor is added by an administrator of an agency alone', async () => {
    const body = { name: 'Nobody', administrator: { name: 'N', email: 'n@nobody.example' } };
    const reviewer = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    await reviewer.post('/api/contractors').send(body).expect(403);
    const theirs = await aSignedIn(test, { organisation: contractor, roles: ['administrator'] });
    await theirs.post('/api/contractors').send(body).expect(403);
    await theirs.get('/api/contractors').expect(403);
  });

  it('a laboratory is seen by its own organisation alone', async () => {
    const technician = await aSignedIn(test, { organisation: contractor, roles: ['laboratory'] });
    const name = 'Penstock Central';
    await technician.post('/api/laboratories').send({ name, accreditation: null }).expect(201);
    await technician.post('/api/laboratories').send({ name, accreditation: null }).expect(409);
    const own = (await technician.get('/api/laboratories')).body;
    expect(own.laboratories).toEqual([expect.objectContaining({ name, mappings: 0 })]);
    expect((await stranger.get('/api/laboratories')).body.laboratories).toEqual([]);
    const reviewer = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    await reviewer.post('/api/laboratories').send({ name, accreditation: null }).expect(403);
  });
});

describe('the settings of an organisation', () => {
  const settings = {
    name: 'Elsewhere Roads',
    timeZone: 'Europe/London',
    reviewWorkingDays: 10,
    waiverPolicy: 'nothing',
    letterhead: { department: 'Pavements', address: '1 High Lane', telephone: '', email: '', closing: '' },
  };

  it('are changed by its administrator alone, on the version that was seen', async () => {
    const reviewer = await aSignedIn(test, { organisation: other, roles: ['reviewer'] });
    await reviewer.patch('/api/organisation').set('If-Match', '1').send(settings).expect(403);
    const { body } = await stranger
      .patch('/api/organisation')
      .set('If-Match', '1')
      .send(settings)
      .expect(200);
    expect(body).toMatchObject({ ...settings, version: 2 });
    const stale = await stranger.patch('/api/organisation').set('If-Match', '1').send(settings);
    expect(stale.status).toBe(412);
    expect(stale.body.present.version).toBe(2);
    expect((await administrator.get('/api/organisation')).body.version).toBe(1);
  });

  it('name a time zone that exists, and from 1 to 120 working days', async () => {
    for (const [change, pointer] of [
      [{ timeZone: 'Europe/Nowhere' }, '/timeZone'],
      [{ reviewWorkingDays: 0 }, '/reviewWorkingDays'],
      [{ reviewWorkingDays: 121 }, '/reviewWorkingDays'],
    ] as const) {
      const answer = await administrator
        .patch('/api/organisation')
        .set('If-Match', '1')
        .send({ ...settings, ...change });
      expect(answer.status).toBe(422);
      expect(answer.body.errors).toEqual([expect.objectContaining({ pointer })]);
    }
  });
});

it('an administrator as such decides, waives, edits rules and submits nothing', async () => {
  const { abilities } = (await (await signIn(test, administrator.email)).get('/api/session')).body;
  expect(abilities).toMatchObject({ upload: false, managePeople: true, manageProjects: true });
});

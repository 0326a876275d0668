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
  test = await startTestApp({ trustedProxies: [] });
  agency = await makeOrganisation(test, { name: 'Larkmoor Roads', kind: 'agency' });
  contractor = await makeOrganisation(test, { name: 'Penstock Paving', kind: 'contractor' });
});

afterAll(() => test.close());

function cookieOf(answer: request.Response): string {
  const [cookie] = answer.get('Set-Cookie') ?? [];
  return cookie ?? '';
}

const trySignIn = (email: string, given: string, headers: Record<string, string> = {}) =>
  request(test.app)
    .post('/api/session')
    .set({ Origin: origin, ...headers })
    .send({ email, password: given });

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

  it('answers alike for a wrong password and an unknown address', async () => {
    const { email } = await makePerson(test, { name: 'Known', email: 'known@larkmoor.example' });
    const sameId = { 'X-Request-Id': 'the-same-number' };
    const wrong = await trySignIn(email, 'not the password', sameId).expect(401);
    const unknown = await trySignIn('nobody@larkmoor.example', 'not the password', sameId).expect(401);
    expect(unknown.text).toBe(wrong.text);
    expect(wrong.body.type).toBe('/problems/wrong-sign-in');
  });

  it('takes the address without regard to case', async () => {
    await makePerson(test, { name: 'Case', email: 'case@larkmoor.example' });
    await trySignIn('Case@Larkmoor.EXAMPLE', password).expect(200);
  });

  it('sets a cookie that scripts cannot read and other sites cannot send', async () => {
    await makePerson(test, { name: 'Cookie', email: 'cookie@larkmoor.example' });
    const cookie = cookieOf(await trySignIn('cookie@larkmoor.example', password));
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
  });

  it('keeps sessions as hashes, so that a copy of the table opens none', async () => {
    const { id } = await makePerson(test, { name: 'Hash', email: 'hash@larkmoor.example' });
    const cookie = cookieOf(await trySignIn('hash@larkmoor.example', password));
    const carried = decodeURIComponent(cookie.split(';')[0]?.split('=')[1] ?? '');
    const [row] = await test.deps.db.select().from(sessions).where(eq(sessions.personId, id));
    expect(row?.token).toMatch(/^[0-9a-f]{64}$/);
    expect(carried).not.toContain(row?.token);
    const signature = carried.split('.')[1];
    const forged = encodeURIComponent(`${row?.token}.${signature}`);
    await request(test.app)
      .get('/api/session')
      .set('Cookie', cookie.replace(/=[^;]*/, `=${forged}`))
      .expect(401);
  });

  it('ends the session on signing out', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    await person.delete('/api/session').expect(204);
    await person.get('/api/session').expect(401);
    const left = await test.deps.db.select().from(sessions).where(eq(sessions.personId, person.personId));
    expect(left).toEqual([]);
  });

  it('does not mount the routes of the sign-in library, whose checks are not ours', async () => {
    for (const path of ['sign-up/email', 'sign-in/email', 'organization/create', 'update-user']) {
      await request(test.app).post(`/api/auth/${path}`).set('Origin', origin).send({}).expect(404);
    }
  });
});

describe('guessing passwords', () => {
  it('stops after ten wrong ones for one address, also with a forged X-Forwarded-For', async () => {
    const email = 'guessed@larkmoor.example';
    await makePerson(test, { name: 'Guessed', email });
    for (let count = 0; count < 10; count += 1) {
      await trySignIn(email, 'a wrong guess', {
        'X-Forwarded-For': `203.0.113.${count}`,
        'X-Clauseway-Address': `203.0.113.${count}`,
      }).expect(401);
    }
    const refused = await trySignIn(email, password, { 'X-Forwarded-For': '203.0.113.99' }).expect(429);
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(0);
  });

  it('leaves other people at the same network address alone', async () => {
    await makePerson(test, { name: 'Neighbour', email: 'neighbour@larkmoor.example' });
    await trySignIn('neighbour@larkmoor.example', password).expect(200);
  });

  it('writes the network address that the connection has, not the one a client claims', async () => {
    const { id } = await makePerson(test, { name: 'Claim', email: 'claim@larkmoor.example' });
    await trySignIn('claim@larkmoor.example', password, {
      'X-Forwarded-For': '203.0.113.7',
      'X-Clauseway-Address': '203.0.113.7',
    }).expect(200);
    const [row] = await test.deps.db.select().from(sessions).where(eq(sessions.personId, id));
    expect(row?.ipAddress).toMatch(/127\.0\.0\.1|^::1$|0000:0001$/);
  });
});

describe('setting a new password', () => {
  it('mails a link that works once and ends every session of the person', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const stranger = browser(test.app);
    await stranger.post('/api/password-resets').send({ email: person.email }).expect(204);
    const [mail] = await test.deps.db.select().from(outbox).where(eq(outbox.subjectId, person.personId));
    const token = /new-password\/([^\s"<]+)/.exec(mail?.text ?? '')?.[1] ?? '';
    const chosen = 'another password of the tests';
    await stranger.post(`/api/password-resets/${token}`).send({ password: chosen }).expect(204);
    await person.get('/api/session').expect(401);
    await trySignIn(person.email, password).expect(401);
    await trySignIn(person.email, chosen).expect(200);
    const again = await stranger.post(`/api/password-resets/${token}`).send({ password: chosen });
    expect(again.status).toBe(410);
  });

  it('mails one link for one key, however often it is asked for, and no address is told apart by it', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const ask = (email: string, key: string) =>
      browser(test.app).post('/api/password-resets').set('Idempotency-Key', key).send({ email });
    for (const email of [person.email, 'nobody@elsewhere.example']) {
      await ask(email, `key-of-${email}`).expect(204);
      await ask(email, `key-of-${email}`).expect(204);
      const other = await ask('another@elsewhere.example', `key-of-${email}`).expect(422);
      expect(other.body.type).toBe('/problems/key-reused');
    }
    const mails = await test.deps.db.select().from(outbox).where(eq(outbox.subjectId, person.personId));
    expect(mails).toHaveLength(1);
    await ask(person.email, 'another-key').expect(204);
    const later = await test.deps.db.select().from(outbox).where(eq(outbox.subjectId, person.personId));
    expect(later).toHaveLength(2);
  });

  it('answers alike for an address that nobody has, and writes no mail', async () => {
    const before = await test.deps.db.select().from(outbox);
    const answer = await browser(test.app)
      .post('/api/password-resets')
      .send({ email: 'nobody@elsewhere.example' });
    expect(answer.status).toBe(204);
    expect(answer.text).toBe('');
    expect(await test.deps.db.select().from(outbox)).toHaveLength(before.length);
  });

  it('refuses a password of fewer than twelve characters and takes one of twelve', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const stranger = browser(test.app);
    await stranger.post('/api/password-resets').send({ email: person.email }).expect(204);
    const [mail] = await test.deps.db.select().from(outbox).where(eq(outbox.subjectId, person.personId));
    const token = /new-password\/([^\s"<]+)/.exec(mail?.text ?? '')?.[1] ?? '';
    const short = await stranger.post(`/api/password-resets/${token}`).send({ password: 'elevenchars' });
    expect(short.status).toBe(422);
    expect(short.body.errors).toEqual([expect.objectContaining({ pointer: '/password' })]);
    await stranger.post(`/api/password-resets/${token}`).send({ password: 'twelve chars' }).expect(204);
  });
});

describe('acting for an organisation', () => {
  it('asks a person with two organisations to choose, and keeps the choice', async () => {
    const { id } = await makePerson(test, { name: 'Both', email: 'both@larkmoor.example' });
    await makeMember(test, { organisationId: agency.id, personId: id, roles: ['reviewer'] });
    await makeMember(test, { organisationId: contractor.id, personId: id, roles: ['quality manager'] });
    const person = await signIn(test, 'both@larkmoor.example');
    expect((await person.get('/api/session')).body.active).toBeNull();
    const refused = await person.get('/api/people');
    expect(refused.body.type).toBe('/problems/no-organisation');
    await person.put('/api/session/organisation').send({ organisationId: contractor.id }).expect(200);
    const { body } = await person.get('/api/session');
    expect(body.active.organisationId).toBe(contractor.id);
    expect(body.abilities).toMatchObject({ upload: true, seeQueue: false });
  });

  it('does not find an organisation that the person does not belong to', async () => {
    const person = await aSignedIn(test, { organisation: agency, roles: ['administrator'] });
    await person.put('/api/session/organisation').send({ organisationId: contractor.id }).expect(404);
    expect((await person.get('/api/session')).body.active.organisationId).toBe(agency.id);
  });
});

describe('today', () => {
  it('is the date in the zone of the agency, and the UTC date for a contractor', async () => {
    const reviewer = await aSignedIn(test, { organisation: agency, roles: ['reviewer'] });
    const manager = await aSignedIn(test, { organisation: contractor, roles: ['quality manager'] });
    const before = test.clock.now;
    // 23:30 UTC is half past midnight of the next day in London's summer time.
    test.clock.set('2026-07-01T23:30:00.000Z');
    expect((await reviewer.get('/api/session')).body.today).toBe('2026-07-02');
    expect((await manager.get('/api/session')).body.today).toBe('2026-07-01');
    test.clock.now = before;
  });
});

import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { people } from '#server/db/schema/people';
import { outbox } from '#server/db/schema/work';
import { demoPassword, demoPeople } from '#server/db/seed/demo-people';
import { seedDemo } from '#server/db/seed/seed-demo';
import { browser, startTestApp, type TestApp } from './harness/test-app';

let test: TestApp;
let folder: string;

beforeAll(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'clauseway-seed-'));
  test = await startTestApp({ dataDirectory: folder });
  await seedDemo(test.deps);
});

afterAll(async () => {
  await test.close();
  rmSync(folder, { recursive: true, force: true });
});

describe('the demo', () => {
  it('lists its people with their password on the sign-in page', async () => {
    const { body } = await browser(test.app).get('/api/sign-in-options').expect(200);
    expect(body.setUpNeeded).toBe(false);
    expect(body.demoPeople.map(({ email }: { email: string }) => email)).toEqual(
      demoPeople.map(({ email }) => email),
    );
  });

  it('has a sign-in of every role of agency and contractor', () => {
    const held = (kind: 'agency' | 'contractor') =>
      new Set(
        demoPeople
          .filter(({ organisation }) => (organisation === 'agency') === (kind === 'agency'))
          .flatMap(({ roles }) => roles),
      );
    expect(held('agency')).toEqual(
      new Set(['reviewer', 'signing engineer', 'rule author', 'laboratory', 'administrator']),
    );
    expect(held('contractor')).toEqual(new Set(['quality manager', 'laboratory', 'administrator']));
  });

  it('lets each of them in', async () => {
    for (const { email, name } of demoPeople) {
      const signedIn = await browser(test.app)
        .post('/api/session')
        .send({ email, password: demoPassword })
        .expect(200);
      expect(signedIn.body.person.name).toBe(name);
    }
  });

  it('no longer shows a password that its person has changed', async () => {
    const email = 'tove.hallam@kestrel-dale.example';
    const tove = browser(test.app);
    await tove.post('/api/password-resets').send({ email }).expect(204);
    const [mail] = await test.deps.db.select().from(outbox).where(eq(outbox.kind, 'password reset'));
    const token = /new-password\/([^\s"<]+)/.exec(mail?.text ?? '')?.[1] ?? '';
    await tove.post(`/api/password-resets/${token}`).send({ password: 'a word of my own' }).expect(204);
    const { body } = await tove.get('/api/sign-in-options');
    expect(JSON.stringify(body)).not.toContain(email);
  });

  it('is made once: seeding again changes nothing', async () => {
    const before = await test.deps.db.select().from(people);
    expect(await seedDemo(test.deps)).toEqual({ seeded: false });
    expect(await test.deps.db.select().from(people)).toEqual(before);
  });

  it('shows a contractor the project with its edition and supplement', async () => {
    const dele = browser(test.app);
    await dele
      .post('/api/session')
      .send({ email: 'dele.fairweather@brightwater.example', password: demoPassword });
    const { body } = await dele.get('/api/projects').expect(200);
    const hollin = body.projects.find(({ number }: { number: string }) => number === 'CV-2031');
    expect(hollin.sections).toEqual([
      expect.objectContaining({
        edition: '2026',
        layers: [expect.stringContaining('S-07')],
        confirmed: true,
      }),
    ]);
    expect(body.projects.map(({ number }: { number: string }) => number)).not.toContain('CV-2027');
  });

  it('writes workbooks to upload by hand', () => {
    const names = readdirSync(path.join(folder, 'demo-workbooks'));
    expect(names.filter((name) => name.endsWith('.xlsx')).length).toBeGreaterThanOrEqual(4);
    expect(names).toContain('README.txt');
  });
});

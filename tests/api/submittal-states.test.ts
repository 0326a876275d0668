import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Disposition } from '#rules/engine/finding';
import { checks } from '#server/db/schema/checks';
import { audit } from '#server/db/schema/people';
import { revisions, submittals } from '#server/db/schema/submittals';
import { outbox } from '#server/db/schema/work';
import {
  aDraft,
  aSubmitted,
  checkAgain,
  type DemoWorld,
  expectStatus,
  pathOf,
  revisionAt,
  startDemoWorld,
  submit,
  upload,
} from './harness/demo-world';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let dele: Browser;
let ines: Browser;
let patience: Browser;

beforeAll(async () => {
  world = await startDemoWorld();
  [dele, ines, patience] = (await Promise.all(
    ['Dele Fairweather', 'Ines Tordoff', 'Patience Adeyinka'].map(world.as),
  )) as [Browser, Browser, Browser];
}, 120_000);
afterAll(() => world.close());

type Place = { submittalId: string; number: number; version: number };

const rowOf = async ({ submittalId, number }: Pick<Place, 'submittalId' | 'number'>) => {
  const [row] = await world.deps.db
    .select()
    .from(revisions)
    .where(and(eq(revisions.submittalId, submittalId), eq(revisions.number, number)));
  if (!row) throw new Error('no such revision');
  return row;
};

/** What a sent return leaves behind. */
async function returned(place: Place, disposition: Disposition): Promise<void> {
  const row = await rowOf(place);
  await world.deps.db
    .update(revisions)
    .set({ state: 'returned', disposition, returnedAt: world.deps.now(), version: row.version + 1 })
    .where(eq(revisions.id, row.id));
  await world.deps.db
    .update(submittals)
    .set({
      updatedAt: world.deps.now(),
      ...(disposition.startsWith('approved')
        ? { standingRevision: place.number, standingDisposition: disposition, standingOn: '2026-03-12' }
        : {}),
      ...(disposition === 'rejected' ? { activeDesignation: null } : {}),
    })
    .where(eq(submittals.id, place.submittalId));
}

describe('submitting', () => {
  it('runs the check of record, starts the clock, mails both sides and is audited', async () => {
    const draft = await aDraft(world, dele, { mixDesignation: 'ST-1', workbook: 'TA-190-B2 r0.xlsx' });
    const mailBefore = world.woken.mail;
    const submitted = expectStatus(await submit(dele, draft), 200).body;
    // 9 March 2026 is a Monday: the tenth working day after it is Monday 23 March.
    expect(submitted).toMatchObject({ state: 'submitted', receivedOn: '2026-03-09', dueOn: '2026-03-23' });
    expect(submitted.workingDaysLeft).toBe(10);
    expect(submitted.declaration.text).toContain('fail: ');
    const row = await rowOf(draft);
    const kept = await world.deps.db.select().from(checks).where(eq(checks.revisionId, row.id));
    expect(kept.map(({ kind, submittedOn }) => [kind, submittedOn])).toEqual([
      ['check of record', '2026-03-09'],
    ]);
    const mails = await world.deps.db.select().from(outbox).where(eq(outbox.subjectId, row.id));
    expect(mails.map(({ kind }) => kind).sort()).toEqual(['receipt', 'review wanted']);
    const word = mails.find(({ kind }) => kind === 'review wanted');
    expect(word?.recipients.map(({ name }) => name).sort()).toEqual(['Ines Tordoff', 'Patience Adeyinka']);
    expect(mails.find(({ kind }) => kind === 'receipt')?.recipients).toEqual([
      { name: 'Dele Fairweather', email: 'dele.fairweather@brightwater.example' },
    ]);
    expect(world.woken.mail).toBe(mailBefore + 1);
    const entries = await world.deps.db.select().from(audit).where(eq(audit.subjectId, row.id));
    expect(entries.map(({ act }) => act)).toContain('revision submitted');
  });

  it('counts day 0 by the agency’s own date', async () => {
    // 29 March 2026, 23:30 UTC is already Monday 30 March in London, where summer time began that night.
    const draft = await aDraft(world, dele, { mixDesignation: 'ST-ZONE' });
    world.clock.set('2026-03-29T23:30:00.000Z');
    const { version } = await revisionAt(dele, draft.submittalId);
    expectStatus(await checkAgain(dele, draft), 201);
    expect((await revisionAt(dele, draft.submittalId)).version).toBe(version);
    const submitted = expectStatus(await submit(dele, draft), 200).body;
    expect(submitted).toMatchObject({ receivedOn: '2026-03-30', dueOn: '2026-04-13' });
    world.clock.set('2026-03-09T09:00:00.000Z');
  });

  it('happens once for one key, and a second submission is refused', async () => {
    const draft = await aDraft(world, dele, { mixDesignation: 'ST-2' });
    const { body: check } = await dele.get(`${pathOf(draft)}/check`).expect(200);
    const send = (key: string) =>
      dele
        .post(`${pathOf(draft)}/submission`)
        .set('Idempotency-Key', key)
        .set('If-Match', `"${draft.version}"`)
        .send({ declaration: check.declaration, accepted: true, seal: check.seal.seal });
    const first = expectStatus(await send('double-click-key'), 200);
    const second = expectStatus(await send('double-click-key'), 200);
    expect(second.text).toBe(first.text);
    const row = await rowOf(draft);
    expect(await world.deps.db.select().from(outbox).where(eq(outbox.subjectId, row.id))).toHaveLength(2);
    expect((await send('another-key')).status).toBe(409);
  });

  it('is refused with another seal, another declaration, an unticked one or an old version', async () => {
    const draft = await aDraft(world, dele, { mixDesignation: 'ST-3' });
    const { body: check } = await dele.get(`${pathOf(draft)}/check`).expect(200);
    const good = { declaration: check.declaration, accepted: true, seal: check.seal.seal };
    const send = (body: object, version = draft.version) =>
      dele
        .post(`${pathOf(draft)}/submission`)
        .set('If-Match', `"${version}"`)
        .send(body);
    expect((await send({ ...good, seal: 'f'.repeat(64) })).body.detail).toMatch(
      /not the ones that were shown/,
    );
    expect((await send({ ...good, declaration: 'All is well.' })).body.detail).toMatch(
      /not the one that these/,
    );
    expect((await send({ ...good, accepted: false })).body.errors[0].pointer).toBe('/accepted');
    expect((await send(good, draft.version - 1)).status).toBe(412);
    expect((await rowOf(draft)).state).toBe('draft');
  });

  it('is refused once the date of the agency has changed, until the check is made again', async () => {
    const draft = await aDraft(world, dele, { mixDesignation: 'ST-4' });
    const { body: check } = await dele.get(`${pathOf(draft)}/check`).expect(200);
    world.clock.set('2026-03-10T09:00:00.000Z');
    const { body: stale } = await dele.get(`${pathOf(draft)}/check`).expect(200);
    expect(stale.stale).toContain('took 9 March 2026 as the day of submission');
    const sent = await dele
      .post(`${pathOf(draft)}/submission`)
      .set('If-Match', `"${draft.version}"`)
      .send({ declaration: check.declaration, accepted: true, seal: check.seal.seal });
    expect(sent.status).toBe(409);
    const again = expectStatus(await checkAgain(dele, draft), 201).body;
    expect(again).toMatchObject({ kind: 'pre-check', submittedOn: '2026-03-10', stale: null });
    expectStatus(await submit(dele, draft), 200);
    world.clock.set('2026-03-09T09:00:00.000Z');
  });

  it.each([
    ['Sorcha Lund', 403],
    ['Gil Ansah', 403],
  ])('is not for %s', async (name, status) => {
    const draft = await aDraft(world, dele);
    expect((await submit(await world.as(name), draft)).status).toBe(status);
  });

  it('has nothing to submit while the workbook is being read', async () => {
    const { body } = expectStatus(await upload(world, dele), 202);
    const answer = await dele
      .post(`${pathOf(body)}/submission`)
      .set('If-Match', `"${body.version}"`)
      .send({ declaration: 'x', accepted: true, seal: 'x' });
    expect(answer.status).toBe(409);
    expect(answer.body.detail).toMatch(/still being read/);
    await world.work();
  });
});

describe('taking a revision for review', () => {
  const take = (person: Browser, place: Place) =>
    person
      .put(`${pathOf(place)}/reviewer`)
      .set('If-Match', `"${place.version}"`)
      .send({});

  it('is for one reviewer at a time: the second is told who was first', async () => {
    const submitted = await aSubmitted(world);
    const [one, other] = await Promise.all([take(ines, submitted), take(patience, submitted)]);
    expect([one.status, other.status].sort()).toEqual([200, 409]);
    const refused = one.status === 409 ? one : other;
    expect(refused.body.type).toBe('/problems/taken');
    expect(refused.body.detail).toMatch(/^(Ines Tordoff|Patience Adeyinka) has taken this revision\.$/);
  });

  it('in a second tab of the same reviewer answers 412 with the present state', async () => {
    const submitted = await aSubmitted(world);
    expectStatus(await take(ines, submitted), 200);
    const stale = expectStatus(await take(ines, submitted), 412);
    expect(stale.body.present).toMatchObject({ state: 'in review', reviewer: { name: 'Ines Tordoff' } });
  });

  it('is undone by whoever holds it, or by a signing engineer', async () => {
    const taken = await aSubmitted(world, { takenBy: 'Ines Tordoff' });
    const giveBack = (person: Browser, version: number) =>
      person.delete(`${pathOf(taken)}/reviewer`).set('If-Match', `"${version}"`);
    expect((await giveBack(patience, taken.version)).status).toBe(403);
    const back = expectStatus(await giveBack(ines, taken.version), 200).body;
    expect(back).toMatchObject({ state: 'submitted', reviewer: null });
    const retaken = expectStatus(await take(patience, back), 200).body;
    expectStatus(await giveBack(await world.as('Mairi Halloran'), retaken.version), 200);
  });

  it.each([
    ['Mairi Halloran', 403],
    ['Edda Marsh', 403],
    ['Tamsin Brook', 403],
    ['Dele Fairweather', 403],
  ])('is not for %s', async (name, status) => {
    const submitted = await aSubmitted(world);
    expect((await take(await world.as(name), submitted)).status).toBe(status);
  });
});

describe('withdrawing', () => {
  const withdraw = (place: Place, person = dele) =>
    person
      .post(`${pathOf(place)}/withdrawal`)
      .set('If-Match', `"${place.version}"`)
      .send({ reason: 'The quarry has closed.' });

  it('ends a revision 0 and frees its designation', async () => {
    const submitted = await aSubmitted(world, { mixDesignation: 'ST-W' });
    expect(expectStatus(await withdraw(submitted), 200).body.state).toBe('withdrawn');
    expectStatus(await upload(world, dele, { mixDesignation: 'ST-W' }), 202);
    await world.work();
  });

  it('is possible in review, not before submission and not after the return', async () => {
    const taken = await aSubmitted(world, { takenBy: 'Ines Tordoff' });
    expectStatus(await withdraw(taken), 200);
    const draft = await aDraft(world, dele);
    expect((await withdraw(draft)).body.detail).toMatch(/is draft, so it cannot be withdrawn/);
    const other = await aSubmitted(world);
    await returned(other, 'approved');
    expect((await withdraw(await revisionAt(dele, other.submittalId))).status).toBe(409);
  });

  it('is the quality manager’s, with a reason', async () => {
    const submitted = await aSubmitted(world);
    expect((await withdraw(submitted, await world.as('Sorcha Lund'))).status).toBe(403);
    const silent = await dele
      .post(`${pathOf(submitted)}/withdrawal`)
      .set('If-Match', `"${submitted.version}"`)
      .send({ reason: ' ' });
    expect(silent.body.errors[0].pointer).toBe('/reason');
  });
});

describe('the next revision', () => {
  const start = async (place: Place, fields: { reason?: string } = {}) => {
    const { laboratory } = await revisionAt(dele, place.submittalId, place.number);
    const sending = dele
      .post(`/api/submittals/${place.submittalId}/revisions`)
      .field('laboratoryId', laboratory.id);
    if (fields.reason !== undefined) sending.field('reason', fields.reason);
    return sending.attach('workbook', await world.workbook('BW-125-S4 r1.xlsx'), 'BW-125-S4 r1.xlsx');
  };

  it('follows “revise and resubmit” as the next number, and says what changed and moved', async () => {
    const first = await aSubmitted(world, { workbook: 'BW-125-S4 r0.xlsx' });
    await returned(first, 'revise and resubmit');
    expect(expectStatus(await start(first), 202).body).toMatchObject({ number: 1, state: 'draft' });
    await world.work();
    const next = await revisionAt(dele, first.submittalId, 1);
    expect(next.revisions.map(({ number }: { number: number }) => number)).toEqual([0, 1]);
    expect(next.revisions[1].changes).toMatch(/readings? changed/);
    const { body: check } = await dele.get(`${pathOf(next)}/check`).expect(200);
    const dust = check.moved.find(({ key }: { key: string }) => key === 'dust-proportion~design point');
    expect(dust).toMatchObject({ previousOutcome: 'fail' });
    const one = await start(first);
    expect(one.body.detail).toMatch(/revision 1 is open as a draft; there is one draft at a time/);
  });

  it('is one draft, however many uploads arrive at once', async () => {
    const first = await aSubmitted(world);
    await returned(first, 'revise and resubmit');
    const answers = await Promise.all([start(first), start(first)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([202, 409]);
    await world.work();
  });

  it('needs a reason after an approval, and leaves the approval standing', async () => {
    const first = await aSubmitted(world);
    await returned(first, 'approved as noted');
    const silent = expectStatus(await start(first), 422);
    expect(silent.body.errors[0].pointer).toBe('/reason');
    const next = expectStatus(await start(first, { reason: 'Another binder source.' }), 202).body;
    expect(next).toMatchObject({
      reasonForRevision: 'Another binder source.',
      standingApproval: { revision: 0, disposition: 'approved as noted' },
    });
    await world.work();
  });

  it('never follows a rejection: the mix is submitted anew', async () => {
    const first = await aSubmitted(world, { mixDesignation: 'ST-R' });
    await returned(first, 'rejected');
    const refused = expectStatus(await start(first), 409);
    expect(refused.body.fix).toMatch(/new submittal/);
    expectStatus(await upload(world, dele, { mixDesignation: 'ST-R' }), 202);
    await world.work();
  });

  it('waits while the agency has the one before', async () => {
    const first = await aSubmitted(world);
    expect(expectStatus(await start(first), 409).body.detail).toMatch(/is with the agency/);
  });
});

describe('the check of a submitted revision', () => {
  it('proves itself when it is repeated', async () => {
    const submitted = await aSubmitted(world, { workbook: 'TA-190-B2 r0.xlsx' });
    for (const person of [dele, ines]) {
      const { body } = await person.get(`${pathOf(submitted)}/check/proof`).expect(200);
      expect(body.result).toBe('same');
      expect(body.repeated).toEqual(body.stored);
    }
  });

  it('is kept beside a new one, by a reviewer', async () => {
    const submitted = await aSubmitted(world);
    expect((await checkAgain(dele, submitted)).status).toBe(409);
    const stale = await ines
      .post(`${pathOf(submitted)}/checks`)
      .set('If-Match', '"1"')
      .send({});
    expect(expectStatus(stale, 412).body.present.number).toBe(0);
    world.clock.set('2026-03-11T09:00:00.000Z');
    const again = expectStatus(await checkAgain(ines, submitted), 201).body;
    world.clock.set('2026-03-09T09:00:00.000Z');
    expect(again).toMatchObject({ kind: 'check of record', submittedOn: '2026-03-09' });
    const row = await rowOf(submitted);
    const kept = await world.deps.db.select().from(checks).where(eq(checks.revisionId, row.id));
    expect(kept.map(({ number }) => number).sort()).toHaveLength(2);
    expect(new Set(kept.map(({ seal }) => seal)).size).toBe(1);
    for (const person of [dele, ines]) {
      const { body: listed } = await person.get(`${pathOf(submitted)}/checks`).expect(200);
      expect(listed.checks.map((each: { madeBy: string }) => each.madeBy)).toEqual([
        'Ines Tordoff',
        'Dele Fairweather',
      ]);
      const [newest, first] = listed.checks;
      expect(first).toMatchObject({
        submittedOn: '2026-03-09',
        base: { ruleSet: 'cvra-412', edition: '2026' },
        seal: again.seal.seal,
        recommended: again.summary.recommended,
      });
      expect(newest.number).toBeGreaterThan(first.number);
      const { body: old } = await person.get(`${pathOf(submitted)}/checks/${first.number}`).expect(200);
      expect(old).toMatchObject(first);
      expect(old.findings).toEqual(again.findings);
      await person.get(`${pathOf(submitted)}/checks/${newest.number + 1}`).expect(404);
    }
  });
});

it('lists submittals page by page, newest change first, without repeating or losing one', async () => {
  const { body: all } = await dele.get('/api/submittals').expect(200);
  const ids = all.items.map(({ id }: { id: string }) => id);
  expect(new Set(ids).size).toBe(ids.length);
  expect(all.nextCursor).toBeNull();
  const times = all.items.map(({ updatedAt }: { updatedAt: string }) => updatedAt);
  expect(times).toEqual([...times].sort().reverse());
  const { body: drafts } = await dele.get('/api/submittals?state=draft').expect(200);
  expect(
    drafts.items.every(({ revision }: { revision: { state: string } }) => revision.state === 'draft'),
  ).toBe(true);
  expect((await dele.get('/api/submittals?cursor=nonsense')).status).toBe(422);
  const { body: none } = await dele.get('/api/submittals?q=%25%25').expect(200);
  expect(none.items).toEqual([]);
});

import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Finding } from '#rules/engine/finding';
import { checks, notes, waivers } from '#server/db/schema/checks';
import { audit, organisations } from '#server/db/schema/people';
import { revisions } from '#server/db/schema/submittals';
import { demoOrganisations } from '#server/db/seed/demo-people';
import type { CheckView } from '#shared/contracts/checks';
import {
  aSubmitted,
  type DemoWorld,
  expectStatus,
  pathOf,
  revisionAt,
  startDemoWorld,
} from './harness/demo-world';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let dele: Browser;
let ines: Browser;
let mairi: Browser;

beforeAll(async () => {
  world = await startDemoWorld();
  [dele, ines, mairi] = (await Promise.all(
    ['Dele Fairweather', 'Ines Tordoff', 'Mairi Halloran'].map(world.as),
  )) as [Browser, Browser, Browser];
}, 120_000);
afterAll(() => world.close());

type Place = { submittalId: string; number: number };

const inReview = (workbook = 'TA-190-B2 r0.xlsx') => aSubmitted(world, { workbook, takenBy: 'Ines Tordoff' });
const checkOf = async (person: Browser, place: Place): Promise<CheckView> =>
  (await person.get(`${pathOf(place)}/check`).expect(200)).body;
const keyOf = ({ rule, subject }: Finding) => `${rule}~${subject}`;
const write = (person: Browser, place: Place, note: object) =>
  person.post(`${pathOf(place)}/notes`).send({ finding: null, ...note });
const textsOf = async (person: Browser, place: Place) =>
  (await checkOf(person, place)).notes.map(({ text }) => text).sort();

async function markReturned(place: Place): Promise<void> {
  await world.deps.db
    .update(revisions)
    .set({ state: 'returned', disposition: 'revise and resubmit', returnedAt: world.deps.now() })
    .where(eq(revisions.submittalId, place.submittalId));
  const sent = { sentAt: world.deps.now() };
  await world.deps.db
    .update(notes)
    .set(sent)
    .where(
      and(
        eq(notes.submittalId, place.submittalId),
        eq(notes.side, 'agency'),
        eq(notes.kind, 'to be returned'),
      ),
    );
  await world.deps.db
    .update(waivers)
    .set(sent)
    .where(and(eq(waivers.submittalId, place.submittalId), eq(waivers.toBeReturned, true)));
}

describe('notes', () => {
  it('of the agency reach the contractor with the return: what is to be returned then, internal ones never', async () => {
    const place = await inReview();
    const key = keyOf((await checkOf(ines, place)).findings[0] as Finding);
    expectStatus(
      await write(ines, place, { kind: 'internal', text: 'Pencil: ask about the baghouse.' }),
      201,
    );
    const note = { finding: key, kind: 'to be returned', text: 'Please correct the sheet.' };
    expectStatus(await write(ines, place, note), 201);
    expect(await textsOf(mairi, place)).toEqual([
      'Pencil: ask about the baghouse.',
      'Please correct the sheet.',
    ]);
    expect(await textsOf(dele, place)).toEqual([]);
    await markReturned(place);
    expect(await textsOf(dele, place)).toEqual(['Please correct the sheet.']);
    for (const path of ['check', 'reading', 'check/proof', 'returned-notes', 'findings.xlsx']) {
      const page = await dele.get(`${pathOf(place)}/${path}`).buffer(true);
      expect(`${page.text}${page.body}`).not.toContain('Pencil');
    }
    const home = await dele.get('/api/home').expect(200);
    expect(home.text).not.toContain('Pencil');
    expect(home.text).toContain('Please correct the sheet.');
  });

  it('of the contractor are seen by the agency as replies, at once while it has the submittal', async () => {
    const place = await inReview();
    expectStatus(await write(dele, place, { kind: 'internal', text: 'Our own affair.' }), 201);
    expectStatus(await write(dele, place, { kind: 'reply', text: 'The new sand arrives on Friday.' }), 201);
    expect(await textsOf(ines, place)).toEqual(['The new sand arrives on Friday.']);
  });

  it('answer what was returned, and travel with the next submission only', async () => {
    const place = await inReview('BW-125-S4 r0.xlsx');
    const note = await write(ines, place, { kind: 'to be returned', text: 'Correct H24.' });
    const early = await write(dele, place, { kind: 'reply', text: 'Soon.', answers: note.body.id });
    expect(expectStatus(early, 422).body.errors[0].pointer).toBe('/answers');
    world.clock.set('2026-03-12T09:00:00.000Z');
    await markReturned(place);
    world.clock.set('2026-03-13T09:00:00.000Z');
    const reply = await write(dele, place, { kind: 'reply', text: 'Done.', answers: note.body.id });
    expect(expectStatus(reply, 201).body).toMatchObject({
      answers: note.body.id,
      abilities: { change: true },
    });
    expect(await textsOf(ines, place)).toEqual(['Correct H24.']);
    const { laboratory } = await revisionAt(dele, place.submittalId);
    await dele
      .post(`/api/submittals/${place.submittalId}/revisions`)
      .field('laboratoryId', laboratory.id)
      .attach('workbook', await world.workbook('BW-125-S4 r1.xlsx'), 'BW-125-S4 r1.xlsx')
      .expect(202);
    await world.work();
    expect(await textsOf(ines, place)).toEqual(['Correct H24.']);
    const next = await revisionAt(dele, place.submittalId, 1);
    const check = await checkOf(dele, next);
    const sent = await dele
      .post(`${pathOf(next)}/submission`)
      .set('If-Match', `"${next.version}"`)
      .send({ declaration: check.declaration, accepted: true, seal: check.seal.seal });
    expectStatus(sent, 200);
    expect(await textsOf(ines, place)).toEqual(['Correct H24.', 'Done.']);
    expect(await textsOf(ines, next)).toEqual(['Correct H24.', 'Done.']);
    const changed = await dele
      .patch(`/api/notes/${reply.body.id}`)
      .set('If-Match', `"${reply.body.version}"`)
      .send({ kind: 'reply', text: 'Not so.' });
    expect(changed.status).toBe(409);
    world.clock.set('2026-03-09T09:00:00.000Z');
  });

  it('are changed and removed by their writer, at the version that was seen', async () => {
    const place = await inReview();
    const { body: note } = expectStatus(await write(ines, place, { kind: 'internal', text: 'One.' }), 201);
    const change = (person: Browser, version: number, text: string) =>
      person
        .patch(`/api/notes/${note.id}`)
        .set('If-Match', `"${version}"`)
        .send({ kind: 'to be returned', text });
    expect((await change(mairi, note.version, 'Mine.')).status).toBe(403);
    expect((await change(dele, note.version, 'Mine.')).status).toBe(404);
    const two = expectStatus(await change(ines, note.version, 'Two.'), 200).body;
    expect(two).toMatchObject({ text: 'Two.', kind: 'to be returned', version: note.version + 1 });
    const stale = expectStatus(await change(ines, note.version, 'Three.'), 412);
    expect(stale.body.present.text).toBe('Two.');
    const remove = (version: number) => ines.delete(`/api/notes/${note.id}`).set('If-Match', `"${version}"`);
    expect((await remove(note.version)).status).toBe(412);
    expectStatus(await remove(two.version), 204);
    expect(await world.deps.db.select().from(notes).where(eq(notes.id, note.id))).toEqual([]);
    const acts = await world.deps.db.select().from(audit).where(eq(audit.subjectId, note.id));
    expect(acts.map(({ act }) => act)).toEqual(['note written', 'note changed', 'note removed']);
  });

  it.each([
    ['Edda Marsh', { kind: 'internal' }, 403],
    ['Tamsin Brook', { kind: 'internal' }, 403],
    ['Gil Ansah', { kind: 'internal' }, 403],
    ['Sorcha Lund', { kind: 'internal' }, 201],
    ['Sorcha Lund', { kind: 'reply' }, 422],
    ['Dele Fairweather', { kind: 'to be returned' }, 422],
    ['Ines Tordoff', { kind: 'reply' }, 422],
    ['Ines Tordoff', { kind: 'internal', finding: 'no-such-rule~mix' }, 422],
  ])('by %s as %o answer %s', async (name, note, status) => {
    const place = await inReview();
    expect((await write(await world.as(name), place, { text: 'A note.', ...note })).status).toBe(status);
  });

  it('hold no more than their column, and never nothing', async () => {
    const place = await inReview();
    expectStatus(await write(ines, place, { kind: 'internal', text: 'é'.repeat(4000) }), 201);
    expect((await write(ines, place, { kind: 'internal', text: 'é'.repeat(4001) })).status).toBe(422);
    expect((await write(ines, place, { kind: 'internal', text: '  ' })).status).toBe(422);
  });
});

describe('waivers', () => {
  const waive = (person: Browser, place: Place, finding: string, reason = 'Known at this plant.') =>
    person.post(`${pathOf(place)}/waivers`).send({ finding, reason, toBeReturned: true });
  const failing = async (place: Place, severity: 'required' | 'advisory') => {
    const { findings } = await checkOf(ines, place);
    const found = findings.find((each) => each.outcome === 'fail' && each.severity === severity);
    if (!found) throw new Error(`no ${severity} fail`);
    return keyOf(found);
  };
  const setPolicy = (waiverPolicy: 'nothing' | 'advisory' | 'all') =>
    world.deps.db
      .update(organisations)
      .set({ waiverPolicy })
      .where(eq(organisations.id, demoOrganisations.agency.id));

  it('accept a fail with a reason, while outcome, seal and count of fails stay', async () => {
    const place = await inReview();
    const before = await checkOf(ines, place);
    const key = await failing(place, 'advisory');
    const waiver = expectStatus(await waive(ines, place, key), 201).body;
    expect(waiver).toMatchObject({ finding: key, by: 'Ines Tordoff', abilities: { remove: true } });
    const after = await checkOf(ines, place);
    expect(after.findings).toEqual(before.findings);
    expect(after.seal).toEqual(before.seal);
    expect(after.summary.fail).toBe(before.summary.fail);
    expect((await waive(ines, place, key)).status).toBe(409);
    expect((await checkOf(dele, place)).waivers).toEqual([]);
    await markReturned(place);
    expect((await checkOf(dele, place)).waivers).toEqual([expect.objectContaining({ finding: key })]);
  });

  it('move the recommendation: nothing required left to put right means approved as noted', async () => {
    const place = await inReview('BW-125-S4 r0.xlsx');
    const { findings, summary } = await checkOf(mairi, place);
    expect(summary.recommended).toBe('revise and resubmit');
    const open = findings.filter(({ severity, outcome }) => severity === 'required' && outcome === 'fail');
    const others = findings.filter(
      ({ severity, outcome }) =>
        severity === 'required' && (outcome === 'not shown' || outcome === 'undecided'),
    );
    for (const finding of open) expectStatus(await waive(mairi, place, keyOf(finding)), 201);
    const after = await checkOf(mairi, place);
    expect(after.summary.recommended).toBe(others.length === 0 ? 'approved as noted' : 'revise and resubmit');
    expect(after.recommendation).not.toMatch(/fail without a waiver/);
  });

  it.each([
    ['nothing', 403, 403],
    ['advisory', 201, 403],
    ['all', 201, 201],
  ] as const)('of a reviewer under “%s” answer %s and %s', async (policy, advisory, required) => {
    await setPolicy(policy);
    const place = await inReview();
    expect((await waive(ines, place, await failing(place, 'advisory'))).status).toBe(advisory);
    expect((await waive(ines, place, await failing(place, 'required'))).status).toBe(required);
    await setPolicy('advisory');
  });

  it('of a signing engineer stand above the policy', async () => {
    await setPolicy('nothing');
    const place = await inReview();
    expectStatus(await waive(mairi, place, await failing(place, 'required')), 201);
    await setPolicy('advisory');
  });

  it('are for fails only, of a revision in review, by those who hold it', async () => {
    const place = await inReview();
    const { findings } = await checkOf(ines, place);
    for (const outcome of ['pass', 'not shown', 'undecided', 'not applicable'] as const) {
      const found = findings.find((each) => each.outcome === outcome);
      if (found) expect((await waive(mairi, place, keyOf(found))).status).toBe(409);
    }
    const key = await failing(place, 'advisory');
    for (const name of ['Patience Adeyinka', 'Edda Marsh', 'Rhona Pike', 'Dele Fairweather']) {
      expect((await waive(await world.as(name), place, key)).status).toBe(403);
    }
    expect((await waive(ines, place, key, '   ')).body.errors[0].pointer).toBe('/reason');
    const untaken = await aSubmitted(world, { workbook: 'TA-190-B2 r0.xlsx' });
    expect((await waive(mairi, untaken, key)).status).toBe(409);
    expect(
      await world.deps.db.select().from(waivers).where(eq(waivers.submittalId, untaken.submittalId)),
    ).toEqual([]);
  });

  it('are taken back until the return is sent, at the version that was seen', async () => {
    const place = await inReview();
    const { body: waiver } = await waive(ines, place, await failing(place, 'advisory'));
    const remove = (person: Browser, version: number) =>
      person.delete(`/api/waivers/${waiver.id}`).set('If-Match', `"${version}"`);
    expect((await remove(dele, waiver.version)).status).toBe(404);
    expect((await remove(await world.as('Patience Adeyinka'), waiver.version)).status).toBe(403);
    expect((await remove(ines, waiver.version + 1)).status).toBe(412);
    expectStatus(await remove(ines, waiver.version), 204);
    const again = await waive(ines, place, await failing(place, 'advisory'));
    await markReturned(place);
    const late = await ines
      .delete(`/api/waivers/${again.body.id}`)
      .set('If-Match', `"${again.body.version}"`);
    expect(late.status).toBe(409);
  });
});

it('keeps the check of record unchanged under notes and waivers', async () => {
  const place = await inReview();
  const rows = () => world.deps.db.select({ seal: checks.seal, result: checks.result }).from(checks);
  const before = await rows();
  await write(ines, place, { kind: 'internal', text: 'A note.' });
  expect(await rows()).toEqual(before);
});

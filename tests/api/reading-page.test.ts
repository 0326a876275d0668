import { createHash } from 'node:crypto';
import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { projects, sections } from '#server/db/schema/projects';
import { mixRecords, revisions, typedAttributes } from '#server/db/schema/submittals';
import { demoProjectId } from '#server/db/seed/seed-projects';
import type { ReadingView } from '#shared/contracts/readings';
import {
  aDraft,
  aSubmitted,
  checkAgain,
  type DemoWorld,
  expectStatus,
  pathOf,
  revisionAt,
  startDemoWorld,
} from './harness/demo-world';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let dele: Browser;
let sorcha: Browser;

beforeAll(async () => {
  world = await startDemoWorld();
  [dele, sorcha] = (await Promise.all(['Dele Fairweather', 'Sorcha Lund'].map(world.as))) as [
    Browser,
    Browser,
  ];
}, 120_000);
afterAll(() => world.close());

type Place = { submittalId: string; number: number };

const readingOf = async (place: Place, person = dele): Promise<ReadingView> =>
  (await person.get(`${pathOf(place)}/reading`).expect(200)).body;
const recordOf = async ({ submittalId }: Place) => {
  const [row] = await world.deps.db
    .select({ record: mixRecords.record })
    .from(mixRecords)
    .innerJoin(revisions, eq(revisions.id, mixRecords.revisionId))
    .where(eq(revisions.submittalId, submittalId));
  if (!row) throw new Error('no record');
  return row.record;
};

describe('doubts', () => {
  let draft: Place & { version: number };
  beforeEach(async () => {
    draft = await aDraft(world, dele, { workbook: 'BW-125-S6 r0.xlsx' });
  }, 60_000);

  const answer = (person: Browser, version: number, answers: object[]) =>
    person
      .put(`${pathOf(draft)}/answers`)
      .set('If-Match', `"${version}"`)
      .send({ answers });

  it('are lettered at their cells with what they may mean, and stand in the declaration', async () => {
    const { doubts } = await readingOf(draft);
    expect(doubts.length).toBeGreaterThanOrEqual(3);
    expect(doubts.map(({ letter }) => letter)).toEqual(['a', 'b', 'c', 'd'].slice(0, doubts.length));
    expect(doubts.map(({ text }) => text)).toEqual(expect.arrayContaining(['2.40*', '4721,5']));
    const { body: check } = await dele.get(`${pathOf(draft)}/check`).expect(200);
    const marked = doubts.find(({ text }) => text === '2.40*');
    expect(check.declaration).toContain(`${marked?.sheet} ${marked?.cell}`);
  });

  it('are answered once: the answer is kept, the reading made and the pre-check replaced', async () => {
    const { doubts, version } = await readingOf(draft);
    const doubt = doubts.find(({ text }) => text === '4721,5');
    if (!doubt) throw new Error('no decimal comma');
    const readingsBefore = (await recordOf(draft)).readings.length;
    const [choice] = doubt.alternatives;
    const given = { sheet: doubt.sheet, cell: doubt.cell, text: doubt.text, answer: choice?.answer };
    const kept = expectStatus(await answer(sorcha, version, [given]), 200).body as ReadingView;
    expect(kept.version).toBe(version + 1);
    expect(kept.doubts.find(({ cell }) => cell === doubt.cell)?.answer).toBe(choice?.answer);
    const record = await recordOf(draft);
    expect(record.readings.length).toBe(readingsBefore + 1);
    expect(record.doubts.map(({ cell }) => cell)).not.toContain(doubt.cell);
    expect((await revisionAt(dele, draft.submittalId)).doubts).toBe(doubts.length - 1);
    const back = await answer(sorcha, kept.version, [{ ...given, answer: null }]);
    expect(expectStatus(back, 200).body.doubts).toEqual(doubts);
    expect((await recordOf(draft)).readings.length).toBe(readingsBefore);
  });

  it('refuse an answer that was not offered, to a cell without doubt or to another text, all at once', async () => {
    const { doubts, version } = await readingOf(draft);
    const [doubt] = doubts;
    const refused = await answer(dele, version, [
      { sheet: doubt?.sheet, cell: doubt?.cell, text: doubt?.text, answer: 'something else' },
      { sheet: doubt?.sheet, cell: doubt?.cell, text: 'another text', answer: 'leave out' },
      { sheet: 'Trials', cell: 'A1', text: '', answer: 'leave out' },
    ]);
    expect(expectStatus(refused, 422).body.errors).toHaveLength(3);
    expect((await readingOf(draft)).version).toBe(version);
  });

  it('in two tabs: the second answer is told the present state and changes nothing', async () => {
    const { doubts, version } = await readingOf(draft);
    const [one, other] = doubts;
    const given = (doubt: typeof one) => [
      { sheet: doubt?.sheet, cell: doubt?.cell, text: doubt?.text, answer: 'leave out' },
    ];
    expectStatus(await answer(dele, version, given(one)), 200);
    const stale = expectStatus(await answer(dele, version, given(other)), 412);
    expect(stale.body.present.version).toBe(version + 1);
  });

  it.each([
    ['Gil Ansah', 403],
    ['Ines Tordoff', 404],
  ])('are not for %s to answer', async (name, status) => {
    const { doubts, version } = await readingOf(draft);
    const [doubt] = doubts;
    const given = [{ sheet: doubt?.sheet, cell: doubt?.cell, text: doubt?.text, answer: 'leave out' }];
    expect((await answer(await world.as(name), version, given)).status).toBe(status);
  });
});

it('refuses every change of the reading once the revision is submitted', async () => {
  const submitted = await aSubmitted(world);
  const refusals = await Promise.all([
    dele
      .put(`${pathOf(submitted)}/attributes`)
      .set('If-Match', `"${submitted.version}"`)
      .send({ attributes: {} }),
    dele
      .put(`${pathOf(submitted)}/answers`)
      .set('If-Match', `"${submitted.version}"`)
      .send({ answers: [{ sheet: 'A', cell: 'A1', text: '', answer: null }] }),
    dele.post(`${pathOf(submitted)}/documents`).field('type', 'binder-certificate'),
    dele
      .put(`${pathOf(submitted)}/workbook`)
      .set('If-Match', `"${submitted.version}"`)
      .attach('workbook', Buffer.from('x'), 'x.xlsx'),
  ]);
  expect(refusals.map(({ status }) => status)).toEqual([409, 409, 409, 409]);
});

describe('attributes in which workbook and project differ', () => {
  it('are asked, are a doubt until answered, and are kept as typed by whom and when', async () => {
    await world.deps.db
      .update(projects)
      .set({ facts: { designTraffic: 30 } })
      .where(eq(projects.id, demoProjectId('CV-2034')));
    const draft = await aDraft(world, dele);
    const view = await readingOf(draft);
    expect(view.asked).toEqual([
      expect.objectContaining({
        name: 'designTraffic',
        reason: 'The workbook says 12 million ESAL, the project says 30 million ESAL.',
        values: [12, 30],
        value: null,
      }),
    ]);
    expect((await revisionAt(dele, draft.submittalId)).doubts).toBe(1);
    const keep = (attributes: object, version: number) =>
      sorcha
        .put(`${pathOf(draft)}/attributes`)
        .set('If-Match', `"${version}"`)
        .send({ attributes });
    const wrong = await keep({ designTraffic: 'much', course: 'base' }, view.version);
    expect(expectStatus(wrong, 422).body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/attributes/designTraffic',
      '/attributes/course',
    ]);
    const kept = expectStatus(await keep({ designTraffic: 30 }, view.version), 200).body as ReadingView;
    expect(kept.asked[0]?.value).toBe(30);
    expect((await recordOf(draft)).attributes.designTraffic).toMatchObject({
      value: 30,
      origin: 'typed',
      typed: { by: 'Sorcha Lund', on: '2026-03-09' },
    });
    expect(await revisionAt(dele, draft.submittalId)).toMatchObject({
      doubts: 0,
      description: '12.5 mm dense-graded surface course · PG 64-22 · 30 million ESAL',
    });
    expectStatus(await keep({ designTraffic: null }, kept.version), 200);
    expect(await world.deps.db.select().from(typedAttributes)).toEqual([]);
    await world.deps.db
      .update(projects)
      .set({ facts: {} })
      .where(eq(projects.id, demoProjectId('CV-2034')));
  });
});

describe('certificates and reports', () => {
  const pdf = Buffer.from('%PDF-1.7\n1 0 obj\n');
  const documentNamed = (view: ReadingView, type: string) =>
    view.documents.find((each) => each.type === type);

  it('are enclosed with their file, which comes back byte for byte and inline', async () => {
    const draft = await aDraft(world, dele);
    const view = await readingOf(draft);
    const row = documentNamed(view, 'binder-certificate') ?? view.documents[0];
    if (!row) throw new Error('the workbook states no document');
    expect(row).toMatchObject({ enclosed: false, file: null, added: false });
    const attached = await sorcha
      .put(`${pathOf(draft)}/documents/${row.id}/file`)
      .set('If-Match', `"${view.version}"`)
      .attach('file', pdf, 'certificate.pdf');
    const now = expectStatus(attached, 200).body as ReadingView;
    const enclosed = now.documents.find(({ id }) => id === row.id);
    expect(enclosed).toMatchObject({
      enclosed: true,
      file: { mediaType: 'application/pdf', bytes: pdf.length },
    });
    expect((await recordOf(draft)).documents.find(({ type }) => type === row.type)?.enclosed).toBe(true);
    const file = await dele
      .get(`${pathOf(draft)}/documents/${row.id}/file`)
      .buffer(true)
      .expect(200);
    expect(createHash('sha256').update(file.body).digest('hex')).toBe(
      createHash('sha256').update(pdf).digest('hex'),
    );
    expect(file.get('Content-Disposition')).toMatch(/^inline/);
    expect(file.get('Content-Security-Policy')).toContain('sandbox');
    const removed = await dele
      .delete(`${pathOf(draft)}/documents/${row.id}`)
      .set('If-Match', `"${now.version}"`);
    const left = expectStatus(removed, 200).body as ReadingView;
    expect(left.documents.find(({ id }) => id === row.id)).toMatchObject({ enclosed: false, file: null });
  });

  it('are added on the page, and gone again', async () => {
    const draft = await aDraft(world, dele);
    const before = await readingOf(draft);
    const { body } = await dele.get(`${pathOf(draft)}/document-types`).expect(200);
    expect(body.types).toContainEqual({ type: 'additive-certificate', label: 'Additive certificate' });
    const added = await dele
      .post(`${pathOf(draft)}/documents`)
      .field('type', 'additive-certificate')
      .field('issuer', 'Cobbold Chemicals')
      .field('date', '2026-02-11')
      .attach('file', pdf, 'additive.pdf');
    const view = expectStatus(added, 201).body as ReadingView;
    const row = documentNamed(view, 'additive-certificate');
    expect(row).toMatchObject({
      issuer: 'Cobbold Chemicals',
      date: '2026-02-11',
      added: true,
      enclosed: true,
    });
    const removed = await dele
      .delete(`${pathOf(draft)}/documents/${row?.id}`)
      .set('If-Match', `"${view.version}"`);
    expect((expectStatus(removed, 200).body as ReadingView).documents).toEqual(before.documents);
  });

  it('refuse files that are neither PDF nor image, whatever their name says, and unknown kinds', async () => {
    const draft = await aDraft(world, dele);
    const send = (type: string, bytes: Buffer, name: string) =>
      dele
        .post(`${pathOf(draft)}/documents`)
        .field('type', type)
        .attach('file', bytes, name);
    const page = await send('binder-certificate', Buffer.from('<html>%PDF-</html>'), 'certificate.pdf');
    expect(expectStatus(page, 422).body.type).toBe('/problems/file-refused');
    const unknown = await send('love-letter', pdf, 'letter.pdf');
    expect(expectStatus(unknown, 422).body.errors[0].pointer).toBe('/type');
    const large = await send(
      'binder-certificate',
      Buffer.concat([pdf, Buffer.alloc(15 * 1024 * 1024)]),
      'l.pdf',
    );
    expect(large.status).toBe(413);
    expect((await readingOf(draft)).documents.every(({ file }) => file === null)).toBe(true);
  });
});

describe('a sheet', () => {
  it('comes by window of rows, with what each of its cells was taken for', async () => {
    const draft = await aDraft(world, dele);
    const sheet = (query: string) => dele.get(`${pathOf(draft)}/sheet?sheet=Trials${query}`);
    const { body } = await sheet('&from=4&to=8').expect(200);
    const rows = new Set(body.sheet.cells.map(({ row }: { row: number }) => row));
    expect([...rows].every((row) => Number(row) >= 4 && Number(row) <= 8)).toBe(true);
    const cells = new Set(body.sheet.cells.map(({ address }: { address: string }) => address));
    expect(body.uses.length).toBeGreaterThan(5);
    expect(body.uses.every(({ cell }: { cell: string }) => cells.has(cell))).toBe(true);
    const whole = await sheet('').expect(200);
    expect(whole.body.sheet.cells.length).toBeGreaterThan(body.sheet.cells.length);
    const missing = await dele.get(`${pathOf(draft)}/sheet?sheet=Nowhere`);
    expect(expectStatus(missing, 422).body.fix).toContain('Trials');
  });

  it('tells what a cell is taken for anew once its doubt is answered', async () => {
    const draft = await aDraft(world, dele, { workbook: 'BW-125-S6 r0.xlsx' });
    const { doubts, version } = await readingOf(draft);
    const doubt = doubts.find(({ text }) => text === '4721,5');
    if (!doubt) throw new Error('no decimal comma');
    const { sheet, cell, text } = doubt;
    const usedAs = async (person: Browser) => {
      const { body } = await person.get(`${pathOf(draft)}/sheet?sheet=${sheet}`).expect(200);
      return body.uses.find((use: { cell: string }) => use.cell === cell)?.use;
    };
    expect(await usedAs(dele)).toBe('doubt');
    await dele
      .put(`${pathOf(draft)}/answers`)
      .set('If-Match', `"${version}"`)
      .send({ answers: [{ sheet, cell, text, answer: doubt.alternatives[0]?.answer }] })
      .expect(200);
    expect(await usedAs(dele)).toBe('read');
    const stranger = await world.as('Bram Ostler');
    expect((await stranger.get(`${pathOf(draft)}/sheet?sheet=${sheet}`)).status).toBe(404);
  }, 60_000);

  it('is the agency’s to see once the revision is submitted', async () => {
    const submitted = await aSubmitted(world);
    const ines = await world.as('Ines Tordoff');
    expect((await ines.get(`${pathOf(submitted)}/sheet?sheet=Trials`)).status).toBe(200);
    const view = await readingOf(submitted, ines);
    expect(view.abilities).toEqual({ answer: false, attach: false });
    expect(view.understood.length).toBeGreaterThan(5);
  });
});

it('marks a check as stale once the section has other layers', async () => {
  const draft = await aDraft(world, dele);
  const [other] = await world.deps.db
    .select({ resolvedHash: sections.resolvedHash })
    .from(sections)
    .where(eq(sections.projectId, demoProjectId('CV-2031')));
  const own = and(eq(sections.projectId, demoProjectId('CV-2034')));
  const [before] = await world.deps.db.select().from(sections).where(own);
  await world.deps.db
    .update(sections)
    .set({ resolvedHash: other?.resolvedHash ?? '' })
    .where(own);
  const { body } = await dele.get(`${pathOf(draft)}/check`).expect(200);
  expect(body.stale).toMatch(/edition or layers have changed/);
  const again = expectStatus(await checkAgain(dele, draft), 201).body;
  expect(again.stale).toBeNull();
  expect(again.seal.resolvedEdition).toBe(other?.resolvedHash);
  await world.deps.db
    .update(sections)
    .set({ resolvedHash: before?.resolvedHash ?? '' })
    .where(own);
});

import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readingActs } from '#server/db/schema/learning';
import { audit } from '#server/db/schema/people';
import { mixRecords, revisions } from '#server/db/schema/submittals';
import type { ReadingPreview } from '#shared/contracts/corrections';
import type { ReadingView } from '#shared/contracts/readings';
import {
  aDraft,
  type DemoWorld,
  expectStatus,
  pathOf,
  revisionAt,
  startDemoWorld,
  submit,
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

/** Headings that nobody but the laboratory knows; what is meant is Gmb, Gmm and a binder content. */
const layout = (values: { gmb: string[]; gmm: string[]; binder: string; head?: string }) =>
  [
    values.head ?? 'Trial,Specimen,K1,K2,Va (%)',
    ...values.gmb.map((gmb, at) => `design,${at + 1},${gmb},${values.gmm[at]},4.${at}`),
    '',
    `Cover figure,${values.binder}`,
  ].join('\n');

const first = layout({ gmb: ['2.412', '2.414'], gmm: ['2.512', '2.511'], binder: '5.2' });
const second = layout({ gmb: ['2.402', '2.404', '2.401'], gmm: ['2.506', '2.507', '2.505'], binder: '5.4' });

const file = (text: string, name = 'own.csv') => ({ name, bytes: Buffer.from(text) });
const a = (text: string, name?: string) => aDraft(world, dele, { workbook: file(text, name) });

const readingOf = async (place: Place, person = dele): Promise<ReadingView> =>
  (await person.get(`${pathOf(place)}/reading`).expect(200)).body;

const recordOf = async ({ submittalId }: Place) => {
  const [row] = await world.deps.db
    .select({ record: mixRecords.record, mapping: mixRecords.mapping })
    .from(mixRecords)
    .innerJoin(revisions, eq(revisions.id, mixRecords.revisionId))
    .where(eq(revisions.submittalId, submittalId));
  if (!row) throw new Error('no record');
  return row;
};

/** "bulk-specific-gravity-mix 1 2.412 C2" */
const saidOf = async (place: Place) =>
  (await recordOf(place)).record.readings
    .map(
      ({ quantity, at, value, source }) =>
        `${quantity} ${at.specimen ?? '-'} ${value} ${source?.cell ?? '-'}`,
    )
    .sort();

const reading = (quantity: string, more: object = {}) => ({ kind: 'reading', quantity, ...more });
const corrections = [
  { sheet: '', range: 'C2:C3', says: reading('bulk-specific-gravity-mix') },
  { sheet: '', range: 'D2:D3', says: reading('maximum-specific-gravity') },
  { sheet: '', range: 'B5', says: reading('binder-content', { unit: '%', at: { trial: 'design' } }) },
];

const post = (place: Place, path: string, version: number, body: object, person = dele) =>
  person
    .post(`${pathOf(place)}/reading/${path}`)
    .set('If-Match', `"${version}"`)
    .send(body);
const preview = async (place: Place, body: object): Promise<ReadingPreview> =>
  expectStatus(await dele.post(`${pathOf(place)}/reading/preview`).send(body), 200).body;

describe('a correction', () => {
  it('is previewed with the readings and findings that it changes, and nothing is kept', async () => {
    const draft = await a(first);
    const before = await saidOf(draft);
    const shown = await preview(draft, { corrections });
    expect(shown.counts).toEqual({ added: 5, removed: 0, changed: 0 });
    expect(shown.readings.map(({ label, after }) => `${label} ${after?.value}`)).toContain(
      'Gmb, design, specimen 1 2.412',
    );
    expect(shown.findings.some((each) => each.before?.outcome !== each.after?.outcome)).toBe(true);
    expect(shown.learned).toHaveLength(3);
    expect(shown.notLearned).toEqual([]);
    expect(await saidOf(draft)).toEqual(before);
    const view = await readingOf(draft);
    expect([view.version, view.corrections, view.learned]).toEqual([draft.version, [], null]);
    expect(await world.deps.db.select().from(readingActs)).toEqual([]);
  });

  it('is kept with who and when, read with row and column, and undone by an act of its own', async () => {
    const draft = await a(first);
    const untouched = await saidOf(draft);
    const audited = () => world.deps.db.select().from(audit).where(eq(audit.act, 'reading changed'));
    const before = (await audited()).length;
    const kept: ReadingView = expectStatus(
      await post(draft, 'corrections', draft.version, { corrections }, sorcha),
      201,
    ).body;
    expect(kept.version).toBe(draft.version + 1);
    expect(kept.corrections.map(({ range, by }) => `${range} ${by}`)).toEqual([
      'C2:C3 Sorcha Lund',
      'D2:D3 Sorcha Lund',
      'B5 Sorcha Lund',
    ]);
    expect(await saidOf(draft)).toEqual([
      'air-voids 1 4 E2',
      'air-voids 2 4.1 E3',
      'binder-content - 5.2 B5',
      'bulk-specific-gravity-mix 1 2.412 C2',
      'bulk-specific-gravity-mix 2 2.414 C3',
      'maximum-specific-gravity 1 2.512 D2',
      'maximum-specific-gravity 2 2.511 D3',
    ]);
    let view = kept;
    for (const { id } of kept.corrections.toReversed())
      view = expectStatus(await post(draft, `acts/${id}/withdrawal`, view.version, {}), 201).body;
    expect([view.corrections, view.learned?.rules]).toEqual([[], 0]);
    expect(await saidOf(draft)).toEqual(untouched);
    const { body } = await dele.get(`${pathOf(draft)}/reading/acts`).expect(200);
    expect(body.acts.map(({ text }: { text: string }) => text)).toEqual([
      'C2:C3 is Gmb',
      'D2:D3 is Gmm',
      'B5 is Pb, design, in %',
    ]);
    expect(body.acts.every((act: { takenBack: object | null }) => act.takenBack !== null)).toBe(true);
    const again = await post(draft, `acts/${kept.corrections[0]?.id}/withdrawal`, view.version, {});
    expect(again.status).toBe(409);
    expect(await audited()).toHaveLength(before + 4);
  });

  it('is refused with every fault at its place', async () => {
    const draft = await a(first);
    const faulty = [
      { sheet: 'Trials', range: 'C2', says: reading('bulk-specific-gravity-mix') },
      { sheet: '', range: 'Z9', says: reading('nothing-known') },
      { sheet: '', range: 'C2', says: reading('bulk-specific-gravity-mix', { unit: 'kPa' }) },
      { sheet: '', range: 'C2', says: { kind: 'attribute', name: 'mood' } },
      { sheet: '', range: 'C2', says: { kind: 'document date', type: 'horoscope' } },
    ];
    const refused = expectStatus(
      await post(draft, 'corrections', draft.version, { corrections: faulty }),
      422,
    );
    expect(refused.body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/corrections/0/sheet',
      '/corrections/1/range',
      '/corrections/1/says/quantity',
      '/corrections/2/says/unit',
      '/corrections/3/says/name',
      '/corrections/4/says/type',
    ]);
  });

  it('is neither for another version, another role nor another organisation', async () => {
    const draft = await a(first);
    const stale = expectStatus(await post(draft, 'corrections', draft.version - 1, { corrections }), 412);
    expect(stale.body.present.version).toBe(draft.version);
    const gil = await world.as('Gil Ansah');
    const ines = await world.as('Ines Tordoff');
    expect((await post(draft, 'corrections', draft.version, { corrections }, gil)).status).toBe(403);
    const foreign = await post(draft, 'corrections', draft.version, { corrections }, ines);
    const absent = await post(
      { ...draft, submittalId: draft.id },
      'corrections',
      draft.version,
      { corrections },
      ines,
    );
    expect([foreign.status, foreign.body.title]).toEqual([404, absent.body.title]);
  });

  it('sets attributes and dates of documents, and what is no reading', async () => {
    const draft = await a(
      ['Mix kind;dense-graded', 'Paper from;2026-02-11', 'Job;7', 'Air voids;4.2'].join('\n'),
    );
    const said = [
      { sheet: '', range: 'B1', says: { kind: 'attribute', name: 'mixType' } },
      { sheet: '', range: 'B2', says: { kind: 'document date', type: 'binder-certificate' } },
      { sheet: '', range: 'B4', says: { kind: 'not a reading' } },
    ];
    expectStatus(await post(draft, 'corrections', draft.version, { corrections: said }), 201);
    const { record } = await recordOf(draft);
    expect(record.attributes.mixType?.value).toBe('dense-graded');
    expect(record.documents).toMatchObject([{ type: 'binder-certificate', date: '2026-02-11' }]);
    expect(record.readings).toEqual([]);
  });
});

describe('a reading that is typed', () => {
  const typed = {
    quantity: 'sand-equivalent',
    value: 52,
    unit: '%',
    testedOn: '2026-02-03',
    method: 'AASHTO T 176',
  };

  it('has the origin typed, by whom and on which day, and counts until the workbook states the same', async () => {
    const draft = await a(first);
    const kept: ReadingView = expectStatus(
      await post(draft, 'typed', draft.version, { readings: [typed] }),
      201,
    ).body;
    expect(kept.typed).toMatchObject([{ label: 'SE', overruled: null, by: 'Dele Fairweather' }]);
    const { record } = await recordOf(draft);
    expect(record.readings.at(-1)).toMatchObject({
      quantity: 'sand-equivalent',
      value: 52,
      origin: 'typed',
      typed: { by: 'Dele Fairweather' },
      source: null,
    });
    const replaced = await dele
      .put(`${pathOf(draft)}/workbook`)
      .set('If-Match', `"${kept.version}"`)
      .attach('workbook', Buffer.from(`${first}\nSand equivalent (%),61`), 'own.csv');
    expectStatus(replaced, 202);
    await world.work();
    const after = await readingOf(draft);
    expect(after.typed[0]?.overruled).toMatch(/says 61/);
    const values = (await recordOf(draft)).record.readings.filter(
      (each) => each.quantity === 'sand-equivalent',
    );
    expect(values.map(({ value, origin }) => [value, origin])).toEqual([[61, 'measured']]);
  });

  it('is refused where the workbook has it, where it was typed, and beyond what can be', async () => {
    const draft = await a(first);
    const inWorkbook = { quantity: 'air-voids', value: 4, unit: '%', at: { trial: 'design', specimen: '1' } };
    const readings = [
      inWorkbook,
      typed,
      { ...typed, value: 51 },
      { ...typed, at: { stockpile: 'Chips' }, value: 520 },
      { quantity: 'sand-equivalent', value: null, unit: '%', at: { stockpile: 'Dust' } },
    ];
    const refused = expectStatus(await post(draft, 'typed', draft.version, { readings }), 422);
    expect(refused.body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/typed/0',
      '/typed/2',
      '/typed/3/value',
      '/typed/4/value',
    ]);
  });
});

describe('what was corrected', () => {
  it('is the laboratory’s mapping: the next workbook of the layout needs no answer and says so', async () => {
    const draft = await a(first, 'one.csv');
    const kept: ReadingView = expectStatus(
      await post(draft, 'corrections', draft.version, { corrections }),
      201,
    ).body;
    expect(kept.learned).toMatchObject({ rules: 3 });
    const next = await a(second, 'two.csv');
    const view = await readingOf(next);
    expect(view.mapping).toEqual({ ...mappingOf(kept), departures: [] });
    expect([view.doubts, view.corrections]).toEqual([[], []]);
    expect(await saidOf(next)).toEqual([
      'air-voids 1 4 E2',
      'air-voids 2 4.1 E3',
      'air-voids 3 4.2 E4',
      'binder-content - 5.4 B6',
      'bulk-specific-gravity-mix 1 2.402 C2',
      'bulk-specific-gravity-mix 2 2.404 C3',
      'bulk-specific-gravity-mix 3 2.401 C4',
      'maximum-specific-gravity 1 2.506 D2',
      'maximum-specific-gravity 2 2.507 D3',
      'maximum-specific-gravity 3 2.505 D4',
    ]);
    const named = `${view.mapping?.name}, version ${view.mapping?.number}`;
    expect((await revisionAt(dele, next.submittalId)).mappingName).toBe(named);
    const sent = expectStatus(await submit(dele, next), 200).body;
    expect(sent.mappingName).toBe(named);
    expect((await recordOf(next)).mapping).toMatchObject({ version: view.mapping?.number, rest: 'headings' });
    await unlearn(kept);
  });

  it('is doubted where the next workbook departs from the layout, and the answer is learned in its turn', async () => {
    const draft = await a(first, 'one.csv');
    const kept: ReadingView = expectStatus(
      await post(draft, 'corrections', draft.version, { corrections }),
      201,
    ).body;
    // The columns change places with their values; nothing but a person knows that.
    const changed = layout({
      head: 'Trial,Specimen,K2,K1,Va (%)',
      gmb: ['2.506', '2.507'],
      gmm: ['2.402', '2.404'],
      binder: '5.4',
    });
    const swapped = await a(changed, 'swapped.csv');
    const view = await readingOf(swapped);
    expect(view.mapping?.departures.map(({ kind, cell }) => `${kind} ${cell}`).sort()).toEqual([
      'moved C1',
      'moved D1',
    ]);
    expect(view.doubts.map(({ cell }) => cell).sort()).toEqual(['C1', 'D1']);
    expect((await saidOf(swapped)).filter((said) => said.includes('gravity'))).toEqual([]);
    const answers = view.doubts.map(({ sheet, cell, text }) => ({
      sheet,
      cell,
      text,
      answer: 'as the mapping says',
    }));
    const answered = await dele
      .put(`${pathOf(swapped)}/answers`)
      .set('If-Match', `"${view.version}"`)
      .send({ answers });
    expect(expectStatus(answered, 200).body.learned.number).toBe((kept.learned?.number ?? 0) + 1);
    const third = await a(changed.replace('2.402', '2.400'), 'third.csv');
    const last = await readingOf(third);
    expect([last.doubts, last.mapping?.departures]).toEqual([[], []]);
    await unlearn(kept);
  });
});

const mappingOf = ({ learned }: ReadingView) =>
  learned && { id: learned.id, name: learned.name, number: learned.number };

/** Retires what a test taught, so that the next one begins without it. */
async function unlearn({ learned }: ReadingView) {
  const { body } = await dele.get(`/api/mappings/${learned?.id}`).expect(200);
  const retired = await dele
    .patch(`/api/mappings/${learned?.id}`)
    .set('If-Match', `"${body.version}"`)
    .send({ retired: true });
  expectStatus(retired, 200);
}

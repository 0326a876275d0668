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
    .map(({ quantity, at, value, source }) => `${quantity} ${at.specimen ?? '-'} ${value} ${source?.cell ?? '-'}`)
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
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type MappingInput, mappingFormat } from '#rules/reading/mapping';
import type { MappingView } from '#shared/contracts/mappings';
import { aDraft, type DemoWorld, expectStatus, pathOf, startDemoWorld } from './harness/demo-world';
import { expectSameAsAbsent } from './harness/same-as-absent';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let dele: Browser;
let laboratoryId: string;

beforeAll(async () => {
  world = await startDemoWorld();
  dele = await world.as('Dele Fairweather');
  const { body } = await dele.get('/api/laboratories').expect(200);
  laboratoryId = body.laboratories[0].id;
}, 120_000);
afterAll(() => world.close());

const workbook = (gmb: string) => ({
  name: 'own.csv',
  bytes: Buffer.from(`Trial,Specimen,K1,Va (%)\ndesign,1,${gmb},4.0\ndesign,2,2.414,4.1`),
});

async function learned(gmb = '2.412'): Promise<MappingView> {
  const draft = await aDraft(world, dele, { workbook: workbook(gmb) });
  const says = { kind: 'reading', quantity: 'bulk-specific-gravity-mix' };
  const kept = await dele
    .post(`${pathOf(draft)}/reading/corrections`)
    .set('If-Match', `"${draft.version}"`)
    .send({ corrections: [{ sheet: '', range: 'C2:C3', says }] });
  const { id } = expectStatus(kept, 201).body.learned;
  return (await dele.get(`/api/mappings/${id}`).expect(200)).body;
}

const change = (mapping: MappingView, body: object, person = dele) =>
  person.patch(`/api/mappings/${mapping.id}`).set('If-Match', `"${mapping.version}"`).send(body);

describe('a mapping', () => {
  it('is listed with what it says and its versions, renamed, retired and taken into use again', async () => {
    const mapping = await learned();
    expect(mapping.sentences).toEqual(['Under “K1”: Gmb.']);
    expect(mapping.versions).toMatchObject([{ number: 1, rules: 1, by: 'Dele Fairweather' }]);
    expect(mapping.versions[0]?.origin).toBe('Learned from own.csv');
    const renamed = expectStatus(await change(mapping, { name: 'Plant sheet' }), 200).body;
    const stale = expectStatus(await change(mapping, { name: 'Another' }), 412);
    expect(stale.body.present.name).toBe('Plant sheet');
    const retired = expectStatus(await change(renamed, { retired: true }), 200).body;
    expect(retired.retiredAt).not.toBeNull();
    const unread = await aDraft(world, dele, { workbook: workbook('2.402') });
    expect((await dele.get(`${pathOf(unread)}/reading`)).body.mapping).toBeNull();
    expectStatus(await change(retired, { retired: false }), 200);
    const read = await aDraft(world, dele, { workbook: workbook('2.403') });
    expect((await dele.get(`${pathOf(read)}/reading`)).body.mapping.name).toBe('Plant sheet');
    const { body } = await dele.get('/api/mappings').expect(200);
    expect(body.mappings).toMatchObject([{ name: 'Plant sheet', usedBy: 1 }]);
  });

  it('is exported as a document and imported as the next version of the same layout', async () => {
    const { body } = await dele.get('/api/mappings').expect(200);
    const [present] = body.mappings;
    const sent = await dele.get(`/api/mappings/${present.id}/document`).expect(200);
    expect(sent.get('Content-Disposition')).toContain('Plant sheet version 1.json');
    const document = sent.body as MappingInput;
    expect(document.format).toBe(mappingFormat);
    const [rule] = document.rules;
    const changed = { ...document, rules: [rule && { ...rule, unit: '1', at: { aging: 'short-term' } }] };
    const given = { laboratoryId, name: 'Brought along', document: changed };
    const plan = expectStatus(await dele.post('/api/mappings/import/preview').send(given), 200).body;
    expect(plan).toEqual({
      replaces: { id: present.id, name: 'Plant sheet', number: 1 },
      added: ['Under “K1”: Gmb, short-term.'],
      removed: ['Under “K1”: Gmb.'],
      unchanged: 0,
      text: 'It becomes version 2 of “Plant sheet”, which reads the same layout.',
    });
    const imported = expectStatus(await dele.post('/api/mappings/import').send(given), 201)
      .body as MappingView;
    expect(imported.versions.map(({ number, origin }) => `${number} ${origin}`)).toEqual([
      '2 Imported',
      '1 Learned from own.csv',
    ]);
    const older = await dele.get(`/api/mappings/${present.id}/document?number=1`).expect(200);
    expect(older.body).toEqual(document);
    await dele.get(`/api/mappings/${present.id}/document?number=9`).expect(404);
  });

  it('is imported only whole: every fault of the document is told at once', async () => {
    const document = {
      format: 'clauseway/mapping@2',
      laboratory: 'Any',
      fingerprint: 'x',
      version: 0,
      rules: [{ id: 'a', anchor: { sheet: null, header: [] }, axis: 'up', quantity: 'air-voids' }],
    };
    const refused = await dele.post('/api/mappings/import').send({ laboratoryId, name: 'Faulty', document });
    const pointers = expectStatus(refused, 422).body.errors.map(
      ({ pointer }: { pointer: string }) => pointer,
    );
    expect(pointers.sort()).toEqual([
      '/document/format',
      '/document/rules/0/anchor/header',
      '/document/rules/0/axis',
      '/document/version',
    ]);
  });

  it('is its organisation’s alone, and for those who read its workbooks to change', async () => {
    const { body } = await dele.get('/api/mappings').expect(200);
    const [mapping] = body.mappings;
    const gil = await world.as('Gil Ansah');
    expect((await change(mapping, { name: 'Mine' }, gil)).status).toBe(403);
    for (const name of ['Ines Tordoff', 'Tamsin Brook']) {
      const person = await world.as(name);
      const path = (id: string) => `/api/mappings/${id}`;
      await expectSameAsAbsent(person, mapping.id, { method: 'get', path });
      await expectSameAsAbsent(person, mapping.id, { method: 'get', path: (id) => `${path(id)}/document` });
      const rename = { method: 'patch', path, body: { name: 'Mine' }, version: mapping.version } as const;
      await expectSameAsAbsent(person, mapping.id, rename);
      expect((await person.get('/api/mappings').expect(200)).body.mappings).toEqual([]);
    }
  });
});

import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { revisions } from '#server/db/schema/submittals';
import type { QueueItem } from '#shared/contracts/queue';
import type { RuleSetView } from '#shared/contracts/rule-sets';
import {
  aDraft,
  aSubmitted,
  type DemoWorld,
  expectStatus,
  pathOf,
  startDemoWorld,
  submit,
} from './harness/demo-world';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let dele: Browser;
let ines: Browser;

/** Thursday 12 March 2026. */
const today = '2026-03-12T10:00:00.000Z';

beforeAll(async () => {
  world = await startDemoWorld();
  [dele, ines] = (await Promise.all(['Dele Fairweather', 'Ines Tordoff'].map(world.as))) as [
    Browser,
    Browser,
  ];
  const at = async (instant: string, options: Parameters<typeof aSubmitted>[1]) => {
    world.clock.set(instant);
    return aSubmitted(world, options);
  };
  // Ten working days: due 10, 13, 23 and 26 March.
  await at('2026-02-24T09:00:00.000Z', { mixDesignation: 'Q-LATE', takenBy: 'Patience Adeyinka' });
  await at('2026-02-27T09:00:00.000Z', {
    mixDesignation: 'Q-WEEK',
    workbook: 'TA-190-B2 r0.xlsx',
    takenBy: 'Ines Tordoff',
  });
  await at('2026-03-09T09:00:00.000Z', { mixDesignation: 'Q-NEXT', project: 'CV-2031' });
  const returned = await at('2026-03-02T09:00:00.000Z', { mixDesignation: 'Q-BACK' });
  await world.deps.db
    .update(revisions)
    .set({
      state: 'returned',
      disposition: 'revise and resubmit',
      returnedAt: new Date('2026-03-05T09:00:00Z'),
    })
    .where(eq(revisions.submittalId, returned.submittalId));
  world.clock.set(today);
  await aDraft(world, dele, { mixDesignation: 'Q-DRAFT' });
}, 240_000);
afterAll(() => world.close());

const queue = async (query = '', person = ines) => (await person.get(`/api/queue${query}`).expect(200)).body;
const names = (items: QueueItem[]) => items.map(({ mixDesignation }) => mixDesignation);

describe('the review queue', () => {
  it('goes by due date in groups, with the clock in working days', async () => {
    const { today: date, items, counts, reviewWorkingDays } = await queue();
    expect(date).toBe('2026-03-12');
    expect(reviewWorkingDays).toBe(10);
    const seen = items.map(({ mixDesignation, group, dueOn, workingDaysLeft }: QueueItem) => [
      mixDesignation,
      group,
      dueOn,
      workingDaysLeft,
    ]);
    expect(seen).toEqual([
      ['Q-LATE', 'late', '2026-03-10', -2],
      ['Q-WEEK', 'due this week', '2026-03-13', 1],
      ['Q-NEXT', 'next week and after', '2026-03-23', 7],
      ['Q-BACK', 'with the contractor', '2026-03-16', null],
    ]);
    expect(counts).toEqual({ everyone: 3, mine: 1, notTaken: 1, toSign: 0, late: 1, withContractors: 1 });
  });

  it('narrows to mine and to what nobody has taken, and orders by project', async () => {
    expect(names((await queue('?who=mine')).items)).toEqual(['Q-WEEK']);
    expect(names((await queue('?who=not+taken')).items)).toEqual(['Q-NEXT']);
    expect(names((await queue('?by=project')).items)).toEqual(['Q-NEXT', 'Q-LATE', 'Q-WEEK', 'Q-BACK']);
    expect((await ines.get('/api/queue?who=nobody')).status).toBe(422);
  });

  it('offers taking and giving back to those who may', async () => {
    const { items } = await queue();
    const may = Object.fromEntries(items.map((item: QueueItem) => [item.mixDesignation, item.abilities]));
    expect(may['Q-NEXT']).toEqual({ take: true, giveBack: false });
    expect(may['Q-WEEK']).toEqual({ take: false, giveBack: true });
    expect(may['Q-LATE']).toEqual({ take: false, giveBack: false });
  });

  it('shows at the cursor what needs looking at and internal notes', async () => {
    const item = (await queue()).items.find(({ mixDesignation }: QueueItem) => mixDesignation === 'Q-WEEK');
    const place = { submittalId: item.submittalId, number: 0 };
    expectStatus(
      await ines.post(`${pathOf(place)}/notes`).send({ finding: null, kind: 'internal', text: 'Ask Bram.' }),
      201,
    );
    const { body } = await ines.get(`/api/queue/${item.submittalId}`).expect(200);
    expect(body.internalNotes).toEqual([{ text: 'Ask Bram.', by: 'Ines Tordoff', on: '2026-03-12' }]);
    const outcomes = new Set(body.findings.map(({ outcome }: { outcome: string }) => outcome));
    expect(outcomes.has('fail')).toBe(true);
    expect(outcomes.has('not applicable')).toBe(false);
  });

  it.each([
    ['Mairi Halloran', 200],
    ['Edda Marsh', 200],
    ['Rhona Pike', 403],
    ['Tamsin Brook', 403],
    ['Dele Fairweather', 403],
  ])('answers %s with %s', async (name, status) => {
    expect((await (await world.as(name)).get('/api/queue')).status).toBe(status);
  });

  it('no longer waits for a contractor whose next revision is in', async () => {
    const { items } = await queue();
    const back = items.find(({ mixDesignation }: QueueItem) => mixDesignation === 'Q-BACK');
    const { body: revision } = await dele.get(`/api/submittals/${back.submittalId}`).expect(200);
    await dele
      .post(`/api/submittals/${back.submittalId}/revisions`)
      .field('laboratoryId', revision.laboratory.id)
      .attach('workbook', await world.workbook('BW-125-S4 r1.xlsx'), 'BW-125-S4 r1.xlsx')
      .expect(202);
    await world.work();
    expect((await queue()).counts.withContractors).toBe(1);
    expectStatus(await submit(dele, { submittalId: back.submittalId, number: 1 }), 200);
    const after = await queue();
    expect(after.counts).toMatchObject({ everyone: 4, withContractors: 0, notTaken: 2 });
  });
});

describe('search', () => {
  const search = async (person: Browser, q: string) =>
    (await person.get(`/api/search?q=${encodeURIComponent(q)}`).expect(200)).body.results;
  const titles = async (person: Browser, q: string) =>
    (await search(person, q)).map(({ title }: { title: string }) => title);

  it('finds submittals by designation and description, projects and clauses, each with its address', async () => {
    expect(await titles(dele, 'q-draft')).toEqual(['Q-DRAFT revision 0']);
    expect(await titles(ines, 'q-draft')).toEqual([]);
    const [project] = await search(dele, 'Hollin');
    expect(await titles(dele, 'Hollin')).toContain('CV-2031');
    expect(project.href).toMatch(/^\/(projects|submittals)\//);
    const clauses = await search(dele, 'dust proportion');
    const clause = clauses.find(({ kind }: { kind: string }) => kind === 'clause');
    expect(clause).toMatchObject({
      title: '412.03(d) Dust proportion',
      href: expect.stringMatching(/^\/rule-sets\/cvra-412\/\d{4}#rule-dust-proportion$/),
    });
  });

  it('keeps to the organisation: neither foreign projects nor signs of a pattern find anything', async () => {
    expect(await titles(dele, 'Ferrow')).toEqual([]);
    expect(await titles(await world.as('Bram Ostler'), 'Ferrow')).toEqual(['CV-2027']);
    expect(await titles(dele, '%_%')).toEqual([]);
    expect((await dele.get('/api/search?q=')).status).toBe(422);
  });
});

describe('rule sets', () => {
  const view = async (person: Browser, path: string): Promise<RuleSetView> =>
    (await person.get(`/api/rule-sets/${path}`).expect(200)).body;

  it('are listed to their agency with states by date and drafts, to a contractor as its projects name them', async () => {
    const { body } = await ines.get('/api/rule-sets').expect(200);
    const own = body.ruleSets.find(({ id }: { id: string }) => id === 'cvra-412');
    const states = own.editions.map(({ edition, state }: { edition: string; state: string }) => [
      edition,
      state,
    ]);
    expect(states).toEqual(
      expect.arrayContaining([
        ['2024', 'superseded'],
        ['2026', 'in force'],
      ]),
    );
    expect(states.find(([edition]: string[]) => edition === '2027')?.[1]).toBe('draft');
    const leda = (await (await world.as('Leda Farrow')).get('/api/rule-sets').expect(200)).body;
    const theirs = leda.ruleSets.find(({ id }: { id: string }) => id === 'cvra-412');
    expect(theirs.editions.map(({ edition }: { edition: string }) => edition).sort()).toEqual([
      '2024',
      '2026',
    ]);
  });

  it('say every rule as a sentence with its condition, rounding, source and tables', async () => {
    const edition = await view(ines, 'cvra-412/2026');
    expect(edition.ruleViews.length).toBeGreaterThanOrEqual(45);
    const vma = edition.ruleViews.find(({ id }) => id === 'vma');
    expect(vma?.sentence).toMatch(/^Voids in the mineral aggregate are at least/);
    const [table] = edition.tables.filter(({ id }) => vma?.tables.includes(id));
    expect(table?.usedBy).toContain('vma');
    expect(table?.columns.some(({ key }) => key)).toBe(true);
    expect(table?.rows.every(({ cells }) => cells.length === table.columns.length)).toBe(true);
    expect(edition.ruleViews.every(({ source }) => source !== '')).toBe(true);
    expect(edition.startingPoint).toBe(true);
  });

  it('apply the chosen layers: added, displaced and removed rules are named with their document', async () => {
    const plain = await view(ines, 'cvra-412/2026');
    expect(plain.availableLayers.map(({ ruleSet }) => ruleSet)).toEqual(['cvra-s-07']);
    const layered = await view(ines, 'cvra-412/2026?layers=cvra-s-07@2026');
    expect(layered.hash).not.toBe(plain.hash);
    expect(layered.removed.length).toBeGreaterThan(0);
    expect(layered.removed.every(({ clause, title }) => clause !== '' && title !== '')).toBe(true);
    expect(layered.ruleViews.some(({ displaced }) => displaced.length > 0)).toBe(true);
    expect(layered.tables.some(({ rows }) => rows.some(({ displaced }) => displaced !== null))).toBe(true);
    expect(layered.templateHref).toContain('layers=');
    expect((await ines.get('/api/rule-sets/cvra-412/2026?layers=nothing@1')).status).toBe(422);
  });

  it('give a template that reads back', async () => {
    const { templateHref } = await view(dele, 'cvra-412/2026');
    const file = await dele.get(templateHref).buffer(true).expect(200);
    expect(file.get('Content-Type')).toContain('spreadsheetml');
  });

  it('give a filled example where one fits, which is read and checked like any upload', async () => {
    const { exampleHref, templateHref } = await view(dele, 'cvra-412/2026');
    expect(exampleHref).toBe(templateHref.replace('template', 'example'));
    const file = await dele
      .get(exampleHref ?? '')
      .responseType('blob')
      .expect(200);
    const draft = await aDraft(world, dele, { workbook: { name: 'example.xlsx', bytes: file.body } });
    const { body: reading } = await dele.get(`${pathOf(draft)}/reading`).expect(200);
    expect(reading.doubts).toEqual([]);
    expect(draft.hasCheck).toBe(true);
  });

  it('give no example where none fits', async () => {
    const { exampleHref } = await view(ines, 'cvra-412/2024');
    expect(exampleHref).toBeNull();
    await ines.get('/api/rule-sets/cvra-412/2024/example.xlsx').expect(404);
  });

  it('are absent alike for others: an unknown edition, a draft to a contractor', async () => {
    const missing = await dele.get('/api/rule-sets/cvra-412/1999').set('X-Request-Id', 'one-number-for-both');
    const draft = await dele.get('/api/rule-sets/cvra-412/2027').set('X-Request-Id', 'one-number-for-both');
    expect(missing.status).toBe(404);
    expect(draft.text).toBe(missing.text);
    expect((await ines.get('/api/rule-sets/cvra-412/2027')).status).toBe(200);
  });
});

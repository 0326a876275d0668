import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { partHash, partsOf } from '#rules/authoring/document-parts';
import type { RuleInput } from '#rules/rule-sets/schema';
import { audit } from '#server/db/schema/people';
import { editions } from '#server/db/schema/rule-sets';
import type { Draft } from '#shared/contracts/drafts';
import { aRecord } from '#tests/builders/a-record';
import { aLayer, aRule, aRuleSet } from '#tests/builders/a-rule-set';
import { type DemoWorld, expectStatus, startDemoWorld } from './harness/demo-world';
import { aSignedIn, makeOrganisation } from './harness/organisations';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let tamsin: Browser;
let joaquim: Browser;
let ines: Browser;
let stranger: Browser;

beforeAll(async () => {
  world = await startDemoWorld();
  [tamsin, joaquim, ines] = (await Promise.all(
    ['Tamsin Brook', 'Joaquim Vale', 'Ines Tordoff'].map(world.as),
  )) as [Browser, Browser, Browser];
  const organisation = await makeOrganisation(world, { name: 'Larkmoor Roads', kind: 'agency' });
  stranger = await aSignedIn(world, { organisation, roles: ['rule author'] });
}, 120_000);
afterAll(() => world.close());

let made = 0;

async function aDraft(person = tamsin, document: object = {}): Promise<Draft> {
  made += 1;
  const file = { kind: 'file', document: { ...aRuleSet({ id: `cvra-9${made}` }), ...document } };
  const answer = await person.post('/api/drafts').send({ edition: '2030', from: file });
  return expectStatus(answer, 201).body;
}

const pathOf = ({ id }: { id: string }) => `/api/drafts/${id}`;
const draftNow = async ({ id }: { id: string }, person = tamsin): Promise<Draft> =>
  (await person.get(pathOf({ id })).expect(200)).body;
const ruleOf = ({ document }: Draft, id = 'vma') =>
  (document.rules as RuleInput[]).find((rule) => rule.id === id) as RuleInput;

function change(person: Browser, seen: Draft, parts: Record<string, unknown>) {
  const changes = Object.entries(parts).map(([part, after]) => ({
    part,
    before: partHash(partsOf(seen.document).get(part)),
    after,
  }));
  return person.post(`${pathOf(seen)}/changes`).send({ changes });
}

const headOf = (draft: Draft, fields: object) => ({
  ...(partsOf(draft.document).get('head') as object),
  ...fields,
});

const act = (person: Browser, draft: Draft, way: 'post' | 'delete', path: string, body: object = {}) =>
  person[way](`${pathOf(draft)}${path}`)
    .set('If-Match', `"${draft.version}"`)
    .send(body);

/** In review, sent by Tamsin Brook, with its first day. */
async function inReview(from = '2030-01-01', document: object = {}): Promise<Draft> {
  const begun = await aDraft(tamsin, document);
  expectStatus(await change(tamsin, begun, { head: headOf(begun, { effective: { from, to: null } }) }), 200);
  const answer = await act(tamsin, await draftNow(begun), 'post', '/review');
  return expectStatus(answer, 200).body;
}

const publish = (person: Browser, draft: Draft, word: string | null = 'The source follows in print.') =>
  act(person, draft, 'post', '/publication', { word });

describe('a draft begins', () => {
  it('from a published edition, with its rules and without its dates', async () => {
    const from = { kind: 'edition', ruleSet: 'cvra-412', edition: '2026' };
    const { body } = expectStatus(await tamsin.post('/api/drafts').send({ edition: '2028', from }), 201);
    expect(body).toMatchObject({
      ruleSet: 'cvra-412',
      edition: '2028',
      state: 'draft',
      startingPoint: true,
      basedOn: { ruleSet: 'cvra-412', edition: '2026' },
      document: { edition: '2028', effective: { from: null, to: null } },
    });
    expect(body.document.rules).toHaveLength(55);
  });

  it('from a starting point, marked as one until its rules are verified', async () => {
    const { body: list } = await tamsin.get('/api/starting-points').expect(200);
    const names = list.startingPoints.map(({ file }: { file: string }) => file);
    expect(names).toContain('cvra-421-2026.json');
    expect(names).not.toContain('cvra-412-2027-draft.json');
    const from = { kind: 'starting point', file: 'cvra-421-2026.json' };
    const { body } = expectStatus(await tamsin.post('/api/drafts').send({ edition: '2029', from }), 201);
    expect(body).toMatchObject({ ruleSet: 'cvra-421', startingPoint: true, basedOn: null });
  });

  it('with nothing in it', async () => {
    const from = { kind: 'nothing', ruleSet: 'cvra-777', title: 'Section 777', layerOf: null };
    const { body } = expectStatus(await tamsin.post('/api/drafts').send({ edition: '1', from }), 201);
    expect(body.document).toMatchObject({
      id: 'cvra-777',
      agency: 'Carrow Valley Roads Authority',
      rules: [],
    });
  });

  it('from a file only where every fault of it is gone', async () => {
    const document = aRuleSet({ rules: [aRule({ limit: { min: { table: 'none', column: 'min' } } })] });
    const from = { kind: 'file', document };
    const { body } = expectStatus(await tamsin.post('/api/drafts').send({ edition: '1', from }), 422);
    expect(body.type).toBe('/problems/rule-set-refused');
    expect(body.errors[0].pointer).toMatch(/^\/from\/document\/rules\/0\/limit/);
  });

  it('under a name that no edition and no draft of the rule set has', async () => {
    const from = { kind: 'edition', ruleSet: 'cvra-412', edition: '2026' };
    for (const edition of ['2024', '2027']) {
      expectStatus(await tamsin.post('/api/drafts').send({ edition, from }), 409);
    }
  });
});

describe('a change of a draft', () => {
  it('keeps the part, names who encoded the rule and is in the audit trail', async () => {
    const draft = await aDraft();
    const answer = await change(joaquim, draft, { 'rules/vma': aRule({ title: 'VMA' }) });
    const { body } = expectStatus(answer, 200);
    expect(body.version).toBe(draft.version + 1);
    const now = await draftNow(draft);
    expect(ruleOf(now)).toMatchObject({ title: 'VMA', verifiedBy: null });
    expect(ruleOf(now).encodedBy).toMatch(/^Joaquim Vale, \d{4}-\d{2}-\d{2}$/);
    expect(body.parts).toEqual([{ part: 'rules/vma', value: ruleOf(now) }]);
    const rows = await world.deps.db.select().from(audit).where(eq(audit.subjectId, draft.id));
    expect(rows.map(({ act }) => act)).toEqual(['draft begun', 'draft changed']);
  });

  it('may leave the draft unfinished', async () => {
    const draft = await aDraft();
    expectStatus(await change(tamsin, draft, { 'rules/new': { id: 'new' } }), 200);
    expect((await draftNow(draft)).document.rules).toHaveLength(2);
  });

  it('by a second author to the same rule is refused with the first one’s version, and loses nothing', async () => {
    const draft = await aDraft();
    expectStatus(await change(joaquim, draft, { 'rules/vma': aRule({ title: 'His' }) }), 200);
    const { body } = expectStatus(
      await change(tamsin, draft, { 'rules/vma': aRule({ title: 'Hers' }) }),
      409,
    );
    expect(body.type).toBe('/problems/draft-conflict');
    expect(body.present).toMatchObject([
      { part: 'rules/vma', present: { title: 'His' }, by: 'Joaquim Vale' },
    ]);
    expect(ruleOf(await draftNow(draft))).toMatchObject({ title: 'His' });
  });

  it('by two authors to different rules keeps both', async () => {
    const draft = await aDraft(tamsin, { rules: [aRule(), aRule({ id: 'va' })] });
    await Promise.all([
      change(joaquim, draft, { 'rules/vma': aRule({ title: 'His' }) }).then((a) => expectStatus(a, 200)),
      change(tamsin, draft, { 'rules/va': aRule({ id: 'va', title: 'Hers' }) }).then((a) =>
        expectStatus(a, 200),
      ),
    ]);
    const now = await draftNow(draft);
    expect([ruleOf(now).title, ruleOf(now, 'va').title]).toEqual(['His', 'Hers']);
  });

  it('cannot carry the draft into another rule set', async () => {
    const draft = await aDraft();
    expectStatus(await change(tamsin, draft, { head: headOf(draft, { id: 'cvra-412' }) }), 422);
    expectStatus(await change(tamsin, draft, { head: headOf(draft, { title: undefined }) }), 422);
  });

  it('is a rule author’s alone', async () => {
    const draft = await aDraft();
    expectStatus(await change(ines, draft, { 'rules/vma': aRule() }), 403);
  });
});

describe('a draft in review', () => {
  it('does not change until it is taken back', async () => {
    const draft = await inReview();
    expect(draft.sentForReview).toMatchObject({ by: { name: 'Tamsin Brook' } });
    expectStatus(await change(tamsin, draft, { 'rules/vma': aRule({ title: 'Late' }) }), 409);
    const { body } = expectStatus(await act(joaquim, draft, 'delete', '/review'), 200);
    expect(body).toMatchObject({ state: 'draft', sentForReview: null });
    expectStatus(await change(tamsin, body, { 'rules/vma': aRule({ title: 'Late' }) }), 200);
  });

  it('has its rules verified by somebody who did not encode them', async () => {
    const begun = await aDraft();
    expectStatus(await change(tamsin, begun, { 'rules/vma': aRule({ title: 'VMA' }) }), 200);
    const sent = (await act(tamsin, await draftNow(begun), 'post', '/review')).body;
    const rules = { rules: ['vma'] };
    expectStatus(await act(tamsin, sent, 'post', '/verified-rules', rules), 403);
    const { body } = expectStatus(await act(joaquim, sent, 'post', '/verified-rules', rules), 200);
    expect(ruleOf(body).verifiedBy).toMatch(/^Joaquim Vale, /);
  });

  it('is published by a second rule author and never changes again', async () => {
    const draft = await inReview();
    expect(draft.abilities.publish).toBe(false);
    expectStatus(await publish(tamsin, draft), 403);
    const wordless = expectStatus(await publish(joaquim, draft, null), 422).body;
    expect(wordless.errors[0]).toMatchObject({ pointer: '/word', detail: 'The draft has 2 warnings.' });
    const { body } = expectStatus(await publish(joaquim, draft), 200);
    expect(body).toMatchObject({ ruleSet: draft.ruleSet, edition: '2030' });
    expectStatus(await tamsin.get(pathOf(draft)), 404);
    const { body: view } = await ines.get(`/api/rule-sets/${draft.ruleSet}/2030`).expect(200);
    expect(view).toMatchObject({ state: 'not yet in force', from: '2030-01-01', startingPoint: false });
    const [row] = await world.deps.db.select().from(editions).where(eq(editions.ruleSetKey, draft.ruleSet));
    expect(row?.secondAuthorId).not.toBe(row?.publishedById);
  });

  it('without a first day, with a failing case, or with a fault is not published and says why', async () => {
    const begun = await aDraft();
    const sent = (await act(tamsin, begun, 'post', '/review')).body;
    expect(expectStatus(await publish(joaquim, sent), 422).body.errors).toMatchObject([
      { pointer: '/effective' },
    ]);
    const proof = {
      id: 'proof',
      title: 'Nothing is read',
      record: aRecord(),
      expected: [{ rule: 'vma', outcome: 'pass' }],
    };
    const failing = await inReview('2030-01-01', { cases: [proof] });
    expect(expectStatus(await publish(joaquim, failing), 422).body).toMatchObject({
      type: '/problems/rule-set-refused',
      errors: [
        { pointer: '/cases/proof', detail: 'The case “Nothing is read” does not give what it expects.' },
      ],
    });
    const unfinished = await aDraft();
    const head = headOf(unfinished, { effective: { from: '2030-01-01', to: null } });
    expectStatus(await change(tamsin, unfinished, { head, 'rules/new': { id: 'new' } }), 200);
    const faulty = (await act(tamsin, await draftNow(unfinished), 'post', '/review')).body;
    const { errors } = expectStatus(await publish(joaquim, faulty), 422).body;
    expect(errors.length).toBeGreaterThan(2);
    expect(errors[0].pointer).toMatch(/^\/rules\/1/);
  });

  it('is refused where its dates meet another edition’s', async () => {
    const from = { kind: 'edition', ruleSet: 'cvra-412', edition: '2026' };
    const { body: begun } = expectStatus(
      await tamsin.post('/api/drafts').send({ edition: '2031', from }),
      201,
    );
    const sentWith = async (draft: Draft, effective: object) => {
      expectStatus(await change(tamsin, draft, { head: headOf(draft, { effective }) }), 200);
      return (await act(tamsin, await draftNow(draft), 'post', '/review')).body as Draft;
    };
    const sameDay = await sentWith(begun, { from: '2026-01-01', to: null });
    expect(expectStatus(await publish(joaquim, sameDay), 422).body.detail).toMatch(
      /^Edition 2026 is in force from/,
    );
    const back = (await act(joaquim, sameDay, 'delete', '/review')).body;
    const around = await sentWith(back, { from: '2025-06-01', to: '2026-01-01' });
    expect(expectStatus(await publish(joaquim, around), 422).body.detail).toMatch(
      /^Edition 2024 is in force until 31 December 2025/,
    );
    const again = (await act(joaquim, around, 'delete', '/review')).body;
    const over = await sentWith(again, { from: '2023-06-01', to: '2024-06-01' });
    expect(expectStatus(await publish(joaquim, over), 422).body.detail).toMatch(/^Edition 2024 begins on/);
  });

  it('over a base is published where the base is', async () => {
    const base = await inReview();
    expectStatus(await publish(joaquim, base), 200);
    const layer = aLayer({ id: `${base.ruleSet}-s1`, layerOf: { id: base.ruleSet, edition: '2030' } });
    const begun = await tamsin
      .post('/api/drafts')
      .send({ edition: '1', from: { kind: 'file', document: layer } });
    const draft: Draft = expectStatus(begun, 201).body;
    const head = headOf(draft, { effective: { from: '2030-02-01', to: null } });
    expectStatus(
      await change(tamsin, draft, { head, 'replace.rules/vma': aRule({ limit: { min: '15.0' } }) }),
      200,
    );
    const sent = (await act(tamsin, await draftNow(draft), 'post', '/review')).body;
    expectStatus(await publish(joaquim, sent), 200);
    const view = await ines
      .get(`/api/rule-sets/${base.ruleSet}/2030?layers=${base.ruleSet}-s1@1`)
      .expect(200);
    expect(view.body.ruleViews[0].displaced).toHaveLength(1);
  });
});

describe('comments on a draft', () => {
  it('stand at their rule, and are changed and removed by their writer alone', async () => {
    const draft = await inReview();
    const path = `${pathOf(draft)}/comments`;
    const written = await joaquim.post(path).send({ rule: 'vma', text: 'The printed table says 14.5.' });
    const { body: comment } = expectStatus(written, 201);
    expect(comment).toMatchObject({ rule: 'vma', by: { name: 'Joaquim Vale' }, mine: true });
    const own = (person: Browser, way: 'patch' | 'delete') =>
      person[way](`${path}/${comment.id}`)
        .set('If-Match', `"${comment.version}"`)
        .send({ text: 'It says 14.0.' });
    expectStatus(await own(tamsin, 'patch'), 403);
    expectStatus(await own(joaquim, 'patch'), 200);
    expectStatus(await own(joaquim, 'delete'), 412);
    const { body } = await tamsin.get(path).expect(200);
    expect(body.comments).toMatchObject([{ text: 'It says 14.0.', mine: false }]);
  });
});

describe('a draft that is not wanted', () => {
  it('is discarded with its comments', async () => {
    const draft = await aDraft();
    expectStatus(
      await tamsin.post(`${pathOf(draft)}/comments`).send({ rule: null, text: 'Never mind.' }),
      201,
    );
    expectStatus(await act(tamsin, draft, 'delete', ''), 204);
    expectStatus(await tamsin.get(pathOf(draft)), 404);
  });
});

describe('a published edition', () => {
  it('is withdrawn with a reason, once', async () => {
    const draft = await inReview();
    expectStatus(await publish(joaquim, draft), 200);
    const path = `/api/rule-sets/${draft.ruleSet}/2030/withdrawal`;
    expectStatus(await ines.post(path).send({ reason: 'Not mine to say.' }), 403);
    expectStatus(await tamsin.post(path).send({ reason: ' ' }), 422);
    expectStatus(await tamsin.post(path).send({ reason: 'Table 4 was printed wrongly.' }), 200);
    const { body } = await ines.get(`/api/rule-sets/${draft.ruleSet}/2030`).expect(200);
    expect(body.state).toBe('withdrawn');
    expectStatus(await tamsin.post(path).send({ reason: 'Again.' }), 409);
  });
});

describe('a rule author of another agency', () => {
  it('finds a draft as absent in every way', async () => {
    const draft = await inReview();
    const nowhere = { ...draft, id: '0197a0a0-0000-7000-8000-000000000001' };
    const bodyOf = async (person: Browser, at: Draft) => {
      const answers = [
        await person.get(pathOf(at)),
        await person.get(`${pathOf(at)}/rule-set.json`),
        await person.get(`${pathOf(at)}/comments`),
        await person.post(`${pathOf(at)}/comments`).send({ rule: null, text: 'Hello?' }),
        await change(person, at, { 'rules/vma': aRule({ title: 'Theirs' }) }),
        await act(person, at, 'post', '/review'),
        await act(person, at, 'delete', '/review'),
        await act(person, at, 'post', '/verified-rules', { rules: ['vma'] }),
        await publish(person, at),
        await act(person, at, 'delete', ''),
      ];
      return answers.map(({ status, body }) => ({ status, body: { ...body, requestId: '' } }));
    };
    const theirs = await bodyOf(stranger, draft);
    expect(theirs).toEqual(await bodyOf(stranger, nowhere));
    expect(theirs.map(({ status }) => status)).toEqual(theirs.map(() => 404));
    expect(await draftNow(draft)).toEqual(draft);
    const withdrawal = await stranger
      .post('/api/rule-sets/cvra-412/2026/withdrawal')
      .send({ reason: 'Ours.' });
    expectStatus(withdrawal, 404);
  });
});

import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { projects, sections } from '#server/db/schema/projects';
import { demoOrganisations } from '#server/db/seed/demo-people';
import { demoProjectId, demoSectionId } from '#server/db/seed/seed-projects';
import { type DemoWorld, startDemoWorld } from './harness/demo-world';
import { aSignedIn, makeOrganisation } from './harness/organisations';
import { expectSameAsAbsent } from './harness/same-as-absent';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
let administrator: Browser;
let author: Browser;
let stranger: Browser;

beforeAll(async () => {
  world = await startDemoWorld();
  administrator = await world.as('Edda Marsh');
  author = await world.as('Tamsin Brook');
  const elsewhere = await makeOrganisation(world, { name: 'Elsewhere Roads', kind: 'agency' });
  stranger = await aSignedIn(world, { organisation: elsewhere, roles: ['administrator', 'rule author'] });
});

afterAll(() => world.close());

const { brightwater, kestrel } = demoOrganisations;

let numbers = 0;

const aProject = (changes: object = {}) => {
  numbers += 1;
  return {
    number: `CV-9${numbers}`,
    title: 'Ferrow Lane, second lot',
    lettingOn: '2026-03-01',
    facts: { designTraffic: 5 },
    contacts: [{ name: 'R. Sandoval', function: 'resident engineer', email: 'r@carrow-valley.example' }],
    contractorIds: [brightwater.id],
    ...changes,
  };
};

async function addProject(changes: object = {}) {
  const { body } = await administrator.post('/api/projects').send(aProject(changes)).expect(201);
  return body;
}

const base = { ruleSet: 'cvra-412', edition: '2026' };
const supplement = { ruleSet: 'cvra-s-07', edition: '2026' };

describe('a project', () => {
  it('is made by an administrator of the agency alone', async () => {
    for (const name of ['Ines Tordoff', 'Mairi Halloran', 'Tamsin Brook', 'Rhona Pike', 'Gil Ansah']) {
      await (await world.as(name)).post('/api/projects').send(aProject()).expect(403);
    }
    const made = await addProject();
    expect(made).toMatchObject({
      title: 'Ferrow Lane, second lot',
      contractors: [{ id: brightwater.id, name: brightwater.name }],
      sections: [],
      version: 1,
    });
  });

  it('states what its editions understand, in their words, and is told at the field what they do not', async () => {
    const made = await addProject({ facts: { designTraffic: '3.5', course: 'wearing' } });
    expect(made.facts).toEqual({ designTraffic: 3.5, course: 'surface' });
    await author.post(`/api/projects/${made.id}/sections`).send({ base, layers: [] }).expect(201);
    const answer = await administrator
      .patch(`/api/projects/${made.id}`)
      .set('If-Match', `"${made.version}"`)
      .send(aProject({ facts: { designTraffic: '3,5', binderGrade: 'PG 99-99' } }));
    expect(answer.status).toBe(422);
    expect(answer.body.errors).toMatchObject([
      { pointer: '/facts/designTraffic', detail: 'Design traffic cannot be “3,5”.' },
      { pointer: '/facts/binderGrade', detail: 'Binder grade cannot be “PG 99-99”.' },
    ]);
    const { body: kept } = await administrator.get(`/api/projects/${made.id}`).expect(200);
    expect(kept.facts).toEqual(made.facts);
  });

  it('is judged by a section in what it stated before, in its words or not at all', async () => {
    const made = await addProject({ facts: { designTraffic: 5 } });
    const state = (facts: object) =>
      world.deps.db
        .update(projects)
        .set({ facts: { ...facts } })
        .where(eq(projects.id, made.id));
    await state({ course: 'roof', designTraffic: 5 });
    const refused = await author.post(`/api/projects/${made.id}/sections`).send({ base, layers: [] });
    expect(refused.status).toBe(422);
    expect(refused.body.errors).toMatchObject([{ pointer: '/facts/course' }]);
    await state({ course: 'Wearing course', designTraffic: 5 });
    const { body } = await author
      .post(`/api/projects/${made.id}/sections`)
      .send({ base, layers: [] })
      .expect(201);
    expect(body.sections).toHaveLength(1);
    expect(body.facts).toEqual({ course: 'surface', designTraffic: 5 });
  });

  it('has a number that no other project of the agency has', async () => {
    const answer = await administrator.post('/api/projects').send(aProject({ number: 'CV-2031' }));
    expect(answer.status).toBe(409);
    expect(answer.body.errors).toEqual([expect.objectContaining({ pointer: '/number' })]);
    await stranger
      .post('/api/projects')
      .send(aProject({ number: 'CV-2031', contractorIds: [] }))
      .expect(201);
  });

  it('takes only contractors that work with the agency', async () => {
    const foreign = await makeOrganisation(world, { name: 'Foreign Paving', kind: 'contractor' });
    const answer = await administrator.post('/api/projects').send(aProject({ contractorIds: [foreign.id] }));
    expect(answer.status).toBe(422);
  });

  it('is seen by its contractors, each beside nobody else, and by no other', async () => {
    const made = await addProject({ contractorIds: [brightwater.id, kestrel.id] });
    const dele = await world.as('Dele Fairweather');
    const { body } = await dele.get(`/api/projects/${made.id}`).expect(200);
    expect(body.contractors).toEqual([{ id: brightwater.id, name: brightwater.name }]);
    expect(body).toMatchObject({ proposals: [], choices: [], abilities: { change: false } });
    const path = (id: string) => `/api/projects/${id}`;
    await expectSameAsAbsent(await world.as('Bram Ostler'), made.id, { method: 'get', path });
  });

  it('of another agency is not there, whatever is asked of it', async () => {
    const theirs = demoProjectId('CV-2031');
    const path = (id: string) => `/api/projects/${id}`;
    const choice = { base, layers: [] };
    const section = demoSectionId('CV-2031');
    await expectSameAsAbsent(stranger, theirs, { method: 'get', path });
    await expectSameAsAbsent(stranger, theirs, {
      ...{ method: 'patch', path, version: 1 },
      body: aProject({ contractorIds: [] }),
    });
    await expectSameAsAbsent(stranger, theirs, {
      ...{ method: 'post', body: choice },
      path: (id) => `/api/projects/${id}/sections`,
    });
    await expectSameAsAbsent(stranger, theirs, {
      ...{ method: 'put', body: choice, version: 1 },
      path: (id) => `/api/projects/${id}/sections/${section}`,
    });
    await expectSameAsAbsent(stranger, theirs, {
      method: 'get',
      path: (id) => `/api/projects/${id}/sections/${section}/template.xlsx`,
    });
    const listed = (await stranger.get('/api/projects')).body.projects;
    expect(listed.map(({ id }: { id: string }) => id)).not.toContain(theirs);
  });

  it('does not lend its sections to another project', async () => {
    const other = demoProjectId('CV-2034');
    await expectSameAsAbsent(author, demoSectionId('CV-2031'), {
      ...{ method: 'put', body: { base, layers: [] }, version: 1 },
      path: (id) => `/api/projects/${other}/sections/${id}`,
    });
  });

  it('is changed on the version that was seen, contacts and contractors with it', async () => {
    const made = await addProject();
    const changed = aProject({ number: made.number, title: 'Third lot', contacts: [], contractorIds: [] });
    const address = `/api/projects/${made.id}`;
    const { body } = await administrator.patch(address).set('If-Match', '"1"').send(changed).expect(200);
    expect(body).toMatchObject({ title: 'Third lot', contacts: [], contractors: [], version: 2 });
    const stale = await administrator.patch(address).set('If-Match', '"1"').send(changed);
    expect(stale.status).toBe(412);
    expect(stale.body.present).toMatchObject({ id: made.id, version: 2 });
    await author.patch(address).set('If-Match', '"2"').send(changed).expect(403);
  });

  it('made twice under one key is one project', async () => {
    const body = aProject();
    const key = 'one key for both sendings';
    const send = () => administrator.post('/api/projects').set('Idempotency-Key', key).send(body);
    expect((await send()).status).toBe(400);
    const good = () =>
      administrator.post('/api/projects').set('Idempotency-Key', 'one-key-for-both').send(body);
    const [first, second] = [await good(), await good()];
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(second.body).toEqual(first.body);
    const rows = await world.deps.db.select().from(projects).where(eq(projects.number, body.number));
    expect(rows).toHaveLength(1);
  });
});

describe('the sections of a project', () => {
  it('are proposed from the letting date: edition and layers that hold on that day', async () => {
    const before = await addProject({ lettingOn: '2026-01-31' });
    expect(before.proposals.map((proposal: { base: object }) => proposal.base)).toEqual([
      expect.objectContaining(base),
      expect.objectContaining({ ruleSet: 'cvra-421', edition: '2026' }),
      expect.objectContaining({ ruleSet: 'cvra-431', edition: '2026' }),
    ]);
    expect(before.proposals[0].layers).toEqual([]);
    const onTheDay = await addProject({ lettingOn: '2026-02-01' });
    expect(onTheDay.proposals[0].layers).toEqual([expect.objectContaining(supplement)]);
    const lastDay = await addProject({ lettingOn: '2025-12-31' });
    expect(lastDay.proposals[0].base.edition).toBe('2024');
    const firstDay = await addProject({ lettingOn: '2026-01-01' });
    expect(firstDay.proposals[0].base.edition).toBe('2026');
    expect((await addProject({ lettingOn: null })).proposals).toEqual([]);
    expect((await addProject({ lettingOn: '2023-12-31' })).proposals).toEqual([]);
  });

  it('are confirmed by a rule author or an administrator, and by nobody else', async () => {
    for (const name of ['Ines Tordoff', 'Mairi Halloran', 'Rhona Pike', 'Dele Fairweather']) {
      const { id } = await addProject();
      const person = await world.as(name);
      await person.post(`/api/projects/${id}/sections`).send({ base, layers: [] }).expect(403);
    }
    for (const person of [author, administrator]) {
      const { id } = await addProject();
      const { body } = await person
        .post(`/api/projects/${id}/sections`)
        .send({ base, layers: [supplement] })
        .expect(201);
      expect(body.sections).toEqual([
        expect.objectContaining({
          base: expect.objectContaining(base),
          layers: [expect.objectContaining(supplement)],
          confirmed: true,
          version: 1,
        }),
      ]);
      expect(body.proposals).toEqual([]);
    }
  });

  it('name published editions that fit together', async () => {
    const { id } = await addProject();
    const send = (choice: object) => author.post(`/api/projects/${id}/sections`).send(choice);
    const draft = await send({ base: { ruleSet: 'cvra-412', edition: '2027' }, layers: [] });
    expect(draft.body.errors).toEqual([expect.objectContaining({ pointer: '/base' })]);
    const misfit = await send({ base: { ruleSet: 'cvra-412', edition: '2024' }, layers: [supplement] });
    expect(misfit.body.type).toBe('/problems/rule-set-refused');
    expect(await world.deps.db.select().from(sections).where(eq(sections.projectId, id))).toEqual([]);
  });

  it('do not move when the letting date does', async () => {
    const made = await addProject({ lettingOn: '2025-06-01' });
    const old = { base: { ruleSet: 'cvra-412', edition: '2024' }, layers: [] };
    await author.post(`/api/projects/${made.id}/sections`).send(old).expect(201);
    const { body } = await administrator
      .patch(`/api/projects/${made.id}`)
      .set('If-Match', '1')
      .send(aProject({ number: made.number, lettingOn: '2026-06-01' }))
      .expect(200);
    expect(body.sections).toEqual([
      expect.objectContaining({ base: expect.objectContaining({ edition: '2024' }) }),
    ]);
  });

  it('are changed on the version of the section', async () => {
    const { id } = await addProject();
    const confirmed = await author
      .post(`/api/projects/${id}/sections`)
      .send({ base, layers: [] })
      .expect(201);
    const section = confirmed.body.sections[0];
    const address = `/api/projects/${id}/sections/${section.id}`;
    const { body } = await author
      .put(address)
      .set('If-Match', '"1"')
      .send({ base, layers: [supplement] })
      .expect(200);
    expect(body.sections[0]).toMatchObject({ version: 2, layers: [expect.objectContaining(supplement)] });
    expect(body.sections[0].resolvedHash).not.toBe(section.resolvedHash);
    await author.put(address).set('If-Match', '"1"').send({ base, layers: [] }).expect(412);
  });

  it('offer a template to everybody who sees the project', async () => {
    const dele = await world.as('Dele Fairweather');
    const { body } = await dele.get(`/api/projects/${demoProjectId('CV-2034')}`).expect(200);
    const answer = await dele.get(body.sections[0].templateHref).buffer(true).expect(200);
    expect(answer.get('Content-Type')).toContain('spreadsheetml');
    expect(answer.get('Content-Disposition')).toContain('CV-2034');
  });
});

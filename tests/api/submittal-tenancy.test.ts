import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { documents, replacedWorkbooks, revisions } from '#server/db/schema/submittals';
import { allRoutes } from '#server/routes/all-routes';
import type { Endpoint } from '#shared/contracts/endpoint';
import {
  aDraft,
  aSubmitted,
  type DemoWorld,
  expectStatus,
  pathOf,
  startDemoWorld,
  upload,
} from './harness/demo-world';
import { aSignedIn, makeOrganisation } from './harness/organisations';
import type { Browser } from './harness/test-app';

let world: DemoWorld;
/** Of an agency that has nothing to do with the submittal. */
let otherReviewer: Browser;
let draft: { submittalId: string; number: number; version: number };
let submitted: { submittalId: string; number: number; version: number };
let ids: Record<'submittalId' | 'jobId' | 'noteId' | 'waiverId' | 'documentId' | 'replacedId', string>;

beforeAll(async () => {
  world = await startDemoWorld();
  submitted = await aSubmitted(world, { workbook: 'TA-190-B2 r0.xlsx', takenBy: 'Ines Tordoff' });
  draft = await aDraft(world, await world.as('Dele Fairweather'));
  ids = await objectsOf(submitted);
  const organisation = await makeOrganisation(world, { name: 'Larkmoor Roads', kind: 'agency' });
  otherReviewer = await aSignedIn(world, { organisation, roles: ['reviewer', 'signing engineer'] });
}, 180_000);
afterAll(() => world.close());

/** A job, a note, a waiver, a document and a replaced workbook of the submitted revision. */
async function objectsOf(place: { submittalId: string; number: number }) {
  const [ines, dele] = [await world.as('Ines Tordoff'), await world.as('Dele Fairweather')];
  const { body: check } = await ines.get(`${pathOf(place)}/check`).expect(200);
  const fail = check.findings.find(
    (finding: { outcome: string; severity: string }) =>
      finding.outcome === 'fail' && finding.severity === 'advisory',
  );
  const finding = `${fail.rule}~${fail.subject}`;
  const note = await ines.post(`${pathOf(place)}/notes`).send({ finding, kind: 'internal', text: 'Ask.' });
  const waiver = await ines
    .post(`${pathOf(place)}/waivers`)
    .send({ finding, reason: 'Known.', toBeReturned: true });
  const { body: revision } = await dele.get(pathOf(place)).expect(200);
  const [row] = await world.deps.db
    .select({ id: documents.id, revision: revisions })
    .from(documents)
    .innerJoin(revisions, eq(revisions.id, documents.revisionId))
    .where(eq(revisions.submittalId, place.submittalId));
  if (!row) throw new Error('The revision is to state a document.');
  const replacedId = world.deps.newId();
  await world.deps.db.insert(replacedWorkbooks).values({
    id: replacedId,
    revisionId: row.revision.id,
    contractorId: row.revision.contractorId,
    fileId: row.revision.workbookFileId,
    replacedById: row.revision.uploadedById,
    replacedAt: world.deps.now(),
  });
  return {
    submittalId: place.submittalId,
    jobId: revision.job.id,
    noteId: expectStatus(note, 201).body.id,
    waiverId: expectStatus(waiver, 201).body.id,
    documentId: row.id,
    replacedId,
  };
}

const nobodys = '0197a0a0-0000-7000-8000-00000000dead';

/** Every route that names a submittal or something that hangs on one. */
const routes = allRoutes({ smtpUrl: 'smtp://127.0.0.1' } as never)
  .map(({ endpoint }) => endpoint)
  .filter(({ path }) => /:(submittalId|jobId|noteId|waiverId)/.test(path))
  .map((endpoint) => ({ name: `${endpoint.method.toUpperCase()} ${endpoint.path}`, endpoint }));

/** A body that the endpoint accepts, so that nothing but the object can be the reason of its answer. */
const bodies: Record<string, object> = {
  '/api/submittals/:submittalId/revisions': { laboratoryId: nobodys },
  '/api/submittals/:submittalId/revisions/:number/submission': {
    declaration: 'x',
    accepted: true,
    seal: 'x',
  },
  '/api/submittals/:submittalId/revisions/:number/withdrawal': { reason: 'x' },
  '/api/submittals/:submittalId/revisions/:number/answers': {
    answers: [{ sheet: 'A', cell: 'A1', text: 'x', answer: null }],
  },
  '/api/submittals/:submittalId/revisions/:number/reading/corrections': {
    corrections: [{ sheet: 'A', range: 'A1', says: { kind: 'not a reading' } }],
  },
  '/api/submittals/:submittalId/revisions/:number/reading/typed': {
    readings: [{ quantity: 'air-voids', value: 4, unit: '%' }],
  },
  '/api/submittals/:submittalId/revisions/:number/attributes': { attributes: {} },
  '/api/submittals/:submittalId/revisions/:number/documents': { type: 'binder-certificate' },
  '/api/submittals/:submittalId/revisions/:number/notes': { finding: null, kind: 'internal', text: 'x' },
  '/api/submittals/:submittalId/revisions/:number/waivers': { finding: 'x', reason: 'x', toBeReturned: true },
  '/api/submittals/:submittalId/revisions/:number/return/readiness': { signingEngineerId: nobodys },
  '/api/submittals/:submittalId/revisions/:number/return': {
    disposition: 'approved',
    reason: '',
    textAbove: '',
    textBelow: '',
    to: [{ name: 'x', email: 'x@firm.example', function: '' }],
    copies: [],
    included: [],
    findingsWorkbook: true,
  },
  '/api/notes/:noteId': { kind: 'internal', text: 'x' },
};

function ask(person: Browser, { method, path, versioned }: Endpoint, named: typeof ids) {
  const address = path
    .replace(':submittalId', named.submittalId)
    .replace(':number', '0')
    .replace(':jobId', named.jobId)
    .replace(':noteId', named.noteId)
    .replace(':waiverId', named.waiverId)
    .replace(':documentId', named.documentId)
    .replace(':replacedId', named.replacedId)
    .replace(':actId', nobodys)
    .replace(':check', '1');
  const query = path.endsWith('/sheet') ? '?sheet=Trials' : '';
  const sending = person[method](address + query).set('X-Request-Id', 'one-number-for-both');
  if (versioned) sending.set('If-Match', '"1"');
  return method === 'get' ? sending : sending.send(bodies[path] ?? {});
}

const absent = {
  submittalId: nobodys,
  jobId: nobodys,
  noteId: nobodys,
  waiverId: nobodys,
  documentId: nobodys,
  replacedId: nobodys,
};

describe('another tenant’s submittal', () => {
  it.each(routes)('$name answers with the same bytes as one that does not exist', async ({ endpoint }) => {
    for (const stranger of [await world.as('Bram Ostler'), otherReviewer]) {
      const foreign = await ask(stranger, endpoint, ids);
      const missing = await ask(stranger, endpoint, absent);
      // The queue is no contractor's, whatever it names.
      const isQueue = endpoint.path.startsWith('/api/queue/') && stranger !== otherReviewer;
      expect(missing.status).toBe(isQueue ? 403 : 404);
      expect(foreign.status).toBe(missing.status);
      expect(foreign.text).toBe(missing.text);
      expect(foreign.get('Content-Type')).toBe(missing.get('Content-Type'));
    }
  });

  it('shows its replaced workbook to its contractor, and the agency that judges it sees none', async () => {
    const path = `${pathOf(submitted)}/replaced-workbooks/`;
    const [dele, ines] = [await world.as('Dele Fairweather'), await world.as('Ines Tordoff')];
    const { body: own } = await dele.get(pathOf(submitted)).expect(200);
    expect(own.replacedWorkbooks).toMatchObject([{ id: ids.replacedId, fileName: 'TA-190-B2 r0.xlsx' }]);
    await dele.get(path + ids.replacedId).expect(200);
    expect((await ines.get(pathOf(submitted)).expect(200)).body.replacedWorkbooks).toEqual([]);
    const ask = (id: string) => ines.get(path + id).set('X-Request-Id', 'one-number-for-both');
    const [hidden, missing] = [await ask(ids.replacedId), await ask(nobodys)];
    expect(hidden.status).toBe(404);
    expect(hidden.text).toBe(missing.text);
  });

  it('is in no list, home, search or queue of anybody else', async () => {
    for (const name of ['Bram Ostler', 'Leda Farrow']) {
      const person = await world.as(name);
      const pages = ['/api/submittals', '/api/home', '/api/search?q=T-'].map((path) => person.get(path));
      for (const page of await Promise.all(pages)) {
        expect(page.status).toBe(200);
        expect(page.text).not.toContain(submitted.submittalId);
        expect(page.text).not.toContain(draft.submittalId);
      }
    }
  });
});

describe('a draft', () => {
  const named = () => ({ ...absent, submittalId: draft.submittalId });
  const own = routes.filter(({ endpoint }) => endpoint.path.includes(':submittalId'));

  it.each(own)('$name answers the agency as if there were none', async ({ endpoint }) => {
    for (const name of ['Ines Tordoff', 'Mairi Halloran']) {
      const person = await world.as(name);
      const hidden = await ask(person, endpoint, named());
      const missing = await ask(person, endpoint, absent);
      expect(hidden.status).toBe(404);
      expect(hidden.text).toBe(missing.text);
    }
  });

  it('is in no list, queue or search of the agency', async () => {
    const ines = await world.as('Ines Tordoff');
    for (const path of ['/api/submittals', '/api/queue', '/api/search?q=T-', '/api/projects']) {
      const page = await ines.get(path).expect(200);
      expect(page.text).not.toContain(draft.submittalId);
    }
    const { body } = await ines.get('/api/submittals').expect(200);
    expect(body.items.map(({ id }: { id: string }) => id)).toEqual([submitted.submittalId]);
  });

  it('of a next revision leaves what the agency sees of the one before as it was', async () => {
    const [dele, ines] = [await world.as('Dele Fairweather'), await world.as('Ines Tordoff')];
    const first = await aSubmitted(world, { mixDesignation: 'TEN-NEXT' });
    await world.deps.db
      .update(revisions)
      .set({ state: 'returned', disposition: 'revise and resubmit', returnedAt: world.deps.now() })
      .where(eq(revisions.submittalId, first.submittalId));
    const before = await ines.get('/api/submittals?q=TEN-NEXT').expect(200);
    const page = await ines.get(`/api/submittals/${first.submittalId}`).expect(200);
    world.clock.set('2026-03-10T09:00:00.000Z');
    const next = await dele
      .post(`/api/submittals/${first.submittalId}/revisions`)
      .field('laboratoryId', page.body.laboratory.id)
      .attach('workbook', await world.workbook('BW-125-S4 r1.xlsx'), 'BW-125-S4 r1.xlsx');
    expectStatus(next, 202);
    await world.work();
    const after = await ines.get('/api/submittals?q=TEN-NEXT').expect(200);
    expect(after.body.items).toEqual(before.body.items);
    const again = await ines.get(`/api/submittals/${first.submittalId}`).expect(200);
    expect(again.body.revisions).toEqual(page.body.revisions);
    expect((await ines.get(`/api/submittals/${first.submittalId}/revisions/1`)).status).toBe(404);
    world.clock.set('2026-03-09T09:00:00.000Z');
  });
});

it('shows the agency a submittal of every contractor, and each contractor its own', async () => {
  const bram = await world.as('Bram Ostler');
  const mine = expectStatus(await upload(world, bram, { workbook: 'TA-190-B2 r1.xlsx' }), 202).body;
  await world.work();
  const { body } = await bram.get('/api/submittals').expect(200);
  expect(body.items.map(({ id }: { id: string }) => id)).toEqual([mine.submittalId]);
});

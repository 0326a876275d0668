import { inArray } from 'drizzle-orm';
import { laboratories } from '#server/db/schema/people';
import { jobs } from '#server/db/schema/work';
import { demoPassword, demoPerson } from '#server/db/seed/demo-people';
import { seedOrganisations } from '#server/db/seed/seed-organisations';
import { demoProjectId, demoSectionId, seedProjects } from '#server/db/seed/seed-projects';
import { seedRuleSets } from '#server/db/seed/seed-rule-sets';
import type { Settings } from '#server/env';
import { jobHandlers } from '#server/jobs/job-handlers';
import { createJobRunner } from '#server/jobs/job-runner';
import { type DemoWorkbook, demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';
import { type Browser, browser, startTestApp, type TestApp } from './test-app';

/** The invented agency, its contractors, rule sets and projects; each test makes its own submittals. */
export interface DemoWorld extends TestApp {
  as(name: string): Promise<Browser>;
  workbook(name: string): Promise<Buffer>;
  /** Runs waiting jobs to their end. */
  work(): Promise<void>;
  laboratoryOf(organisationId: string): Promise<string>;
}

export async function startDemoWorld(overrides: Partial<Settings> = {}): Promise<DemoWorld> {
  const test = await startTestApp(overrides);
  await test.deps.db.transaction(async (tx) => {
    await seedOrganisations(tx);
    await seedRuleSets(tx);
    await seedProjects(tx);
  });
  const signedIn = new Map<string, Promise<Browser>>();
  return {
    ...test,
    as(name) {
      const found = signedIn.get(name) ?? signIn(test, name);
      signedIn.set(name, found);
      return found;
    },
    workbook: workbookNamed,
    work: () => runJobs(test),
    async laboratoryOf(organisationId) {
      const rows = await test.deps.db.select().from(laboratories);
      const found = rows.find((each) => each.organisationId === organisationId);
      if (!found) throw new Error('This organisation has no laboratory.');
      return found.id;
    },
  };
}

export interface UploadOptions {
  project?: string;
  mixDesignation?: string;
  /** Name of a demo workbook, or a file of its own. */
  workbook?: string | { name: string; bytes: Buffer };
}

let designations = 0;

/** Uploads revision 0 of a new submittal; the answer comes while it is still to be read. */
export async function upload(
  world: DemoWorld,
  person: Browser,
  { project = 'CV-2034', mixDesignation, workbook = 'BW-125-S4 r0.xlsx' }: UploadOptions = {},
) {
  designations += 1;
  const file =
    typeof workbook === 'string' ? { name: workbook, bytes: await world.workbook(workbook) } : workbook;
  const { body: session } = await person.get('/api/session').expect(200);
  return person
    .post('/api/submittals')
    .field('projectId', demoProjectId(project))
    .field('sectionId', demoSectionId(project))
    .field('laboratoryId', await world.laboratoryOf(session.active.organisationId))
    .field('mixDesignation', mixDesignation ?? `T-${designations}`)
    .attach('workbook', file.bytes, file.name);
}

/** A draft that is read and checked. */
export async function aDraft(world: DemoWorld, person: Browser, options: UploadOptions = {}) {
  const { body } = await upload(world, person, options).then((response) => expectStatus(response, 202));
  await world.work();
  return revisionAt(person, body.submittalId, body.number);
}

/** A revision as its page shows it now. */
export async function revisionAt(person: Browser, submittalId: string, number = 0) {
  const { body } = await person.get(pathOf({ submittalId, number })).expect(200);
  return body;
}

export function pathOf({ submittalId, number }: { submittalId: string; number: number }): string {
  return `/api/submittals/${submittalId}/revisions/${number}`;
}

/** Submits a draft with the declaration and the seal that its findings show. */
export async function submit(person: Browser, place: { submittalId: string; number: number }) {
  const { body: check } = await person.get(`${pathOf(place)}/check`).expect(200);
  const { version } = await revisionAt(person, place.submittalId, place.number);
  return person
    .post(`${pathOf(place)}/submission`)
    .set('If-Match', `"${version}"`)
    .send({ declaration: check.declaration, accepted: true, seal: check.seal.seal });
}

/** Has a revision checked anew as its page shows it now. */
export async function checkAgain(person: Browser, place: { submittalId: string; number: number }) {
  const { version } = await revisionAt(person, place.submittalId, place.number);
  return person
    .post(`${pathOf(place)}/checks`)
    .set('If-Match', `"${version}"`)
    .send({});
}

/** A revision 0 in the agency's hands, taken by the reviewer where one is named. */
export async function aSubmitted(world: DemoWorld, options: UploadOptions & { takenBy?: string } = {}) {
  const dele = await world.as('Dele Fairweather');
  const draft = await aDraft(world, dele, options);
  const submitted = expectStatus(await submit(dele, draft), 200).body;
  if (options.takenBy === undefined) return submitted;
  const reviewer = await world.as(options.takenBy);
  const taken = await reviewer
    .put(`${pathOf(submitted)}/reviewer`)
    .set('If-Match', `"${submitted.version}"`)
    .send({});
  return expectStatus(taken, 200).body;
}

export function expectStatus<Response extends { status: number; body: unknown }>(
  response: Response,
  status: number,
): Response {
  if (response.status === status) return response;
  throw new Error(`expected ${status}, got ${response.status}: ${JSON.stringify(response.body)}`);
}

async function signIn(test: TestApp, name: string): Promise<Browser> {
  const person = browser(test.app);
  const { email } = demoPerson(name);
  await person.post('/api/session').send({ email, password: demoPassword }).expect(200);
  return person;
}

let written: Promise<DemoWorkbook[]> | undefined;

async function workbookNamed(name: string): Promise<Buffer> {
  written ??= demoWorkbooks();
  const found = (await written).find((each) => each.name === name);
  if (!found) throw new Error(`The demo has no workbook ${name}.`);
  return found.bytes;
}

async function runJobs({ deps }: TestApp): Promise<void> {
  const runner = createJobRunner({ deps, handlers: jobHandlers, owner: deps.newId(), pollMs: 20 });
  runner.start();
  try {
    for (;;) {
      const open = await deps.db
        .select({ id: jobs.id })
        .from(jobs)
        .where(inArray(jobs.state, ['waiting', 'running']))
        .limit(1);
      if (open.length === 0) return;
      await new Promise((resolve) => setTimeout(resolve, 15));
    }
  } finally {
    await runner.stop();
  }
}

import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { checks } from '#server/db/schema/checks';
import { cellGrids, files } from '#server/db/schema/files';
import { mixRecords, readings, revisions } from '#server/db/schema/submittals';
import { jobs } from '#server/db/schema/work';
import { jobHandlers } from '#server/jobs/job-handlers';
import { createJobRunner } from '#server/jobs/job-runner';
import type { WorkbookPool } from '#server/workbook/pool';
import {
  type DemoWorld,
  expectStatus,
  pathOf,
  revisionAt,
  startDemoWorld,
  upload,
} from './harness/demo-world';
import type { Browser } from './harness/test-app';
import { eventually } from './harness/waiting';

let world: DemoWorld;
let dele: Browser;

beforeAll(async () => {
  world = await startDemoWorld();
  dele = await world.as('Dele Fairweather');
}, 120_000);
afterAll(() => world.close());

const jobOf = async (jobId: string) => {
  const [job] = await world.deps.db.select().from(jobs).where(eq(jobs.id, jobId));
  if (!job) throw new Error('no job');
  return job;
};

/** A server whose decoder stands still until it is let go. */
function aServer({ held }: { held: boolean }) {
  let letGo = () => {};
  const gate = new Promise<void>((resolve) => {
    letGo = resolve;
  });
  let entered = false;
  const pool: WorkbookPool = {
    async decode(task) {
      entered = true;
      if (held) await gate;
      return world.deps.pool.decode({ ...task, signal: undefined });
    },
    close: async () => {},
  };
  const owner = world.deps.newId();
  // Without a heartbeat: to others this server is dead once its lease has run out.
  const runner = createJobRunner({
    deps: { ...world.deps, pool },
    handlers: jobHandlers,
    owner,
    // One at a time, so that it cannot take over from itself.
    concurrency: 1,
    pollMs: 20,
    heartbeatMs: 600_000,
  });
  return { runner, owner, letGo, entered: () => entered };
}

/** By the database's clock, which no test can move. */
const expireLease = (jobId: string) =>
  world.deps.db
    .update(jobs)
    .set({ leaseUntil: sql`utc_timestamp(3) - interval 1 second` })
    .where(eq(jobs.id, jobId));

async function traces(submittalId: string) {
  const [revision] = await world.deps.db
    .select()
    .from(revisions)
    .where(eq(revisions.submittalId, submittalId));
  const id = revision?.id ?? '';
  return {
    checks: await world.deps.db.select({ id: checks.id }).from(checks).where(eq(checks.revisionId, id)),
    records: await world.deps.db
      .select({ id: mixRecords.revisionId })
      .from(mixRecords)
      .where(eq(mixRecords.revisionId, id)),
    readings: await world.deps.db
      .select({ id: readings.id })
      .from(readings)
      .where(eq(readings.revisionId, id)),
    grids: await world.deps.db
      .select({ id: cellGrids.id })
      .from(cellGrids)
      .where(eq(cellGrids.fileId, revision?.workbookFileId ?? '')),
  };
}

describe('a server that dies in the middle of reading', () => {
  it('is followed by another once its lease has run out, and nothing is read twice when it wakes again', async () => {
    const { body } = expectStatus(await upload(world, dele), 202);
    const dying = aServer({ held: true });
    dying.runner.start();
    await eventually(dying.entered);
    expect(await jobOf(body.job.id)).toMatchObject({ state: 'running', owner: dying.owner });
    expect((await revisionAt(dele, body.submittalId)).job.progress).toBe('Opening the workbook.');

    const other = aServer({ held: false });
    other.runner.start();
    await new Promise((resolve) => setTimeout(resolve, 200));
    expect((await jobOf(body.job.id)).owner).toBe(dying.owner);

    await expireLease(body.job.id);
    await eventually(async () => (await jobOf(body.job.id)).state === 'done', 60_000);
    const before = await traces(body.submittalId);
    expect(before).toMatchObject({ checks: [{}], records: [{}], grids: [{}] });

    dying.letGo();
    await dying.runner.stop();
    await other.runner.stop();
    expect(await traces(body.submittalId)).toEqual(before);
    expect(await jobOf(body.job.id)).toMatchObject({ state: 'done', attempts: 2, owner: null });
  }, 120_000);

  it('is followed from the stored cells where it had come that far', async () => {
    const { body } = expectStatus(await upload(world, dele), 202);
    const dead = aServer({ held: false });
    const cut = {
      ...dead,
      runner: createJobRunner({
        deps: { ...world.deps, newId: failAfterCells() },
        handlers: jobHandlers,
        owner: dead.owner,
        pollMs: 20,
        heartbeatMs: 600_000,
      }),
    };
    cut.runner.start();
    await eventually(async () => (await traces(body.submittalId)).grids.length === 1, 60_000);
    await cut.runner.stop();
    await world.deps.db
      .update(jobs)
      .set({ state: 'waiting', owner: null, leaseUntil: null })
      .where(eq(jobs.id, body.job.id));
    // Decoding again would be seen: this server's decoder never answers.
    const next = aServer({ held: true });
    next.runner.start();
    await eventually(async () => (await jobOf(body.job.id)).state === 'done', 60_000);
    expect(next.entered()).toBe(false);
    expect(await traces(body.submittalId)).toMatchObject({ checks: [{}], records: [{}], grids: [{}] });
    next.letGo();
    await next.runner.stop();
  }, 120_000);
});

/** Ids until the cells are kept; then the server is gone. */
function failAfterCells(): () => string {
  let left = 60;
  return () => {
    left -= 1;
    if (left < 0) throw new Error('the server is gone');
    return world.deps.newId();
  };
}

describe('a reading that is under way', () => {
  it('is cancelled from the page: its result is not written, and another workbook can follow', async () => {
    const { body } = expectStatus(await upload(world, dele), 202);
    const server = aServer({ held: true });
    server.runner.start();
    await eventually(server.entered);
    const cancel = dele
      .post(`/api/jobs/${body.job.id}/cancellation`)
      .set('If-Match', `"${body.job.version}"`);
    expectStatus(await cancel.send(), 200);
    server.letGo();
    await eventually(async () => (await jobOf(body.job.id)).state === 'cancelled', 60_000);
    await server.runner.stop();
    expect(await traces(body.submittalId)).toMatchObject({ checks: [], records: [] });
    const draft = await revisionAt(dele, body.submittalId);
    const replaced = await dele
      .put(`${pathOf(draft)}/workbook`)
      .set('If-Match', `"${draft.version}"`)
      .attach('workbook', await world.workbook('BW-125-S4 r1.xlsx'), 'BW-125-S4 r1.xlsx');
    expectStatus(replaced, 202);
    await world.work();
    expect(await revisionAt(dele, body.submittalId)).toMatchObject({
      hasCheck: true,
      job: { state: 'done' },
    });
  }, 120_000);

  it('gives way to the workbook that replaces its own', async () => {
    const { body } = expectStatus(await upload(world, dele), 202);
    const server = aServer({ held: true });
    server.runner.start();
    await eventually(server.entered);
    const replaced = await dele
      .put(`${pathOf(body)}/workbook`)
      .set('If-Match', `"${body.version}"`)
      .attach('workbook', await world.workbook('BW-125-S4 r1.xlsx'), 'BW-125-S4 r1.xlsx');
    expectStatus(replaced, 202);
    server.letGo();
    await eventually(async () => (await jobOf(body.job.id)).state === 'cancelled', 60_000);
    await server.runner.stop();
    await world.work();
    const now = await revisionAt(dele, body.submittalId);
    expect(now).toMatchObject({ hasCheck: true, workbook: { fileName: 'BW-125-S4 r1.xlsx' } });
    const [file] = await world.deps.db.select().from(files).where(eq(files.sha256, now.workbook.sha256));
    expect(file?.fileName).toBe('BW-125-S4 r1.xlsx');
  }, 120_000);
});

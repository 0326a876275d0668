import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { organisations } from '#server/db/schema/people';
import { jobs } from '#server/db/schema/work';
import { cancelJob } from '#server/jobs/cancel-job';
import { enqueueJob } from '#server/jobs/enqueue-job';
import type { JobHandler } from '#server/jobs/job-handlers';
import { claimJob, renewLease } from '#server/jobs/job-leases';
import { createJobRunner } from '#server/jobs/job-runner';
import { Problem } from '#server/problem';
import { makeOrganisation } from './harness/organisations';
import { startTestApp, type TestApp } from './harness/test-app';
import { eventually } from './harness/waiting';

let test: TestApp;
let organisation: { id: string; name: string };

beforeAll(async () => {
  test = await startTestApp();
  organisation = await makeOrganisation(test, { name: 'Penstock Paving', kind: 'contractor' });
});

afterAll(() => test.close());

async function aJob(kind: string): Promise<string> {
  const id = test.deps.newId();
  await enqueueJob(test.deps.db, {
    id,
    organisationId: organisation.id,
    kind,
    subject: { kind: 'revision', id },
    payload: { of: kind },
    createdById: null,
    createdAt: test.deps.now(),
  });
  return id;
}

async function rowOf(id: string) {
  const [row] = await test.deps.db.select().from(jobs).where(eq(jobs.id, id));
  if (!row) throw new Error('no such job');
  return row;
}

const stateOf = async (id: string) => (await rowOf(id)).state;
const expire = (id: string) =>
  test.deps.db
    .update(jobs)
    .set({ leaseUntil: sql`utc_timestamp(3) - interval 1 second` })
    .where(eq(jobs.id, id));

function runnerOf(handlers: Record<string, JobHandler>, owner = test.deps.newId()) {
  return createJobRunner({ deps: test.deps, handlers, owner, pollMs: 50, heartbeatMs: 50 });
}

describe('claiming a job', () => {
  it('gives each job to exactly one of many that ask at the same time', async () => {
    const ids = await Promise.all(Array.from({ length: 5 }, () => aJob('contested')));
    const owners = Array.from({ length: 8 }, () => test.deps.newId());
    const claimed = await Promise.all(
      owners.map(async (owner) => {
        const own: string[] = [];
        for (let job = await claim(owner); job; job = await claim(owner)) own.push(job.id);
        return own;
      }),
    );
    expect(claimed.flat().sort()).toEqual([...ids].sort());
    function claim(owner: string) {
      return claimJob(test.deps.db, { owner, kinds: ['contested'] });
    }
  });

  it('leaves a job alone while its lease holds, and takes it over once the lease has expired', async () => {
    const id = await aJob('orphaned');
    const [first, second] = [test.deps.newId(), test.deps.newId()];
    const kinds = ['orphaned'];
    expect((await claimJob(test.deps.db, { owner: first, kinds }))?.id).toBe(id);
    expect(await claimJob(test.deps.db, { owner: second, kinds })).toBeNull();
    await expire(id);
    expect(await claimJob(test.deps.db, { owner: second, kinds })).toMatchObject({ id, attempts: 2 });
    expect(await renewLease(test.deps.db, { id, owner: first })).toBe(false);
    expect(await renewLease(test.deps.db, { id, owner: second })).toBe(true);
  });

  it('goes by the clock of the database, not by that of the server', async () => {
    const id = await aJob('clock');
    test.clock.set('2036-01-01T00:00:00.000Z');
    await claimJob(test.deps.db, { owner: test.deps.newId(), kinds: ['clock'] });
    expect(await claimJob(test.deps.db, { owner: test.deps.newId(), kinds: ['clock'] })).toBeNull();
    test.clock.set('2026-03-09T09:00:00.000Z');
    expect(await stateOf(id)).toBe('running');
  });
});

describe('running a job', () => {
  it('reports how far it is and ends as done', async () => {
    const id = await aJob('counted');
    const seen: string[] = [];
    const runner = runnerOf({
      counted: async ({ report }) => {
        for (const done of [1, 2]) {
          await report({ text: `${done} of 2 sheets.`, done, total: 2 });
          const row = await rowOf(id);
          seen.push(`${row.progress} ${row.done}/${row.total}`);
        }
      },
    });
    runner.start();
    await eventually(async () => (await stateOf(id)) === 'done');
    await runner.stop();
    expect(seen).toEqual(['1 of 2 sheets. 1/2', '2 of 2 sheets. 2/2']);
    expect((await rowOf(id)).owner).toBeNull();
  });

  it('keeps a problem as the reason of the failure, with its remedy', async () => {
    const id = await aJob('refused');
    const runner = runnerOf({
      refused: async () => {
        throw new Problem('file-refused', { detail: 'Sheet 2 is damaged.', fix: 'Save it again.' });
      },
    });
    runner.start();
    await eventually(async () => (await stateOf(id)) === 'failed');
    await runner.stop();
    expect(await rowOf(id)).toMatchObject({
      attempts: 1,
      problem: { slug: 'file-refused', detail: 'Sheet 2 is damaged.', fix: 'Save it again.', href: null },
    });
  });

  it('tries again after an unexpected failure, four times at most', async () => {
    const id = await aJob('broken');
    let runs = 0;
    const runner = runnerOf({
      broken: async () => {
        runs += 1;
        throw new Error('unexpected');
      },
    });
    runner.start();
    await eventually(async () => (await stateOf(id)) === 'failed');
    await runner.stop();
    expect(runs).toBe(4);
    expect((await rowOf(id)).problem).toMatchObject({ slug: 'internal' });
  });

  it('lets go of a job when the server stops, and the next server resumes it where it was', async () => {
    const id = await aJob('resumed');
    const first = runnerOf({
      resumed: async ({ report, signal }) => {
        await report({ resumeFrom: { sheet: 3 } });
        await new Promise((resolve) => signal.addEventListener('abort', resolve));
        await report({ resumeFrom: { sheet: 4 } });
      },
    });
    first.start();
    await eventually(async () => (await rowOf(id)).resumeFrom !== null);
    await first.stop();
    expect(await rowOf(id)).toMatchObject({ state: 'waiting', owner: null });
    const from: unknown[] = [];
    const second = runnerOf({ resumed: async ({ job }) => void from.push(job.resumeFrom) });
    second.start();
    await eventually(async () => (await stateOf(id)) === 'done');
    await second.stop();
    expect(from).toEqual([{ sheet: 3 }]);
  });

  it('writes no result once its lease is lost: the transaction rolls back', async () => {
    const id = await aJob('overtaken');
    const name = 'written by a job that had lost its lease';
    let failed = false;
    const runner = runnerOf({
      overtaken: async ({ deps, complete }) => {
        await test.deps.db
          .update(jobs)
          .set({ owner: '0197a0a0-0000-7000-8000-000000000009' })
          .where(eq(jobs.id, id));
        try {
          await deps.db.transaction(async (tx) => {
            await tx.update(organisations).set({ name }).where(eq(organisations.id, organisation.id));
            await complete(tx);
          });
        } catch (error) {
          failed = true;
          throw error;
        }
      },
    });
    runner.start();
    await eventually(() => failed);
    await runner.stop();
    const [row] = await test.deps.db
      .select()
      .from(organisations)
      .where(eq(organisations.id, organisation.id));
    expect(row?.name).toBe(organisation.name);
  });
});

describe('cancelling a job', () => {
  const cancel = (id: string, organisationId = organisation.id) =>
    cancelJob(test.deps.db, { id, organisationId, now: test.deps.now() });

  it('ends a waiting one at once', async () => {
    const id = await aJob('never started');
    await cancel(id);
    expect(await stateOf(id)).toBe('cancelled');
  });

  it('ends a running one at its next heartbeat', async () => {
    const id = await aJob('endless');
    const runner = runnerOf({
      endless: ({ signal }) =>
        new Promise((_resolve, reject) =>
          signal.addEventListener('abort', () => reject(new Error('aborted'))),
        ),
    });
    runner.start();
    await eventually(async () => (await stateOf(id)) === 'running');
    await cancel(id);
    await eventually(async () => (await stateOf(id)) === 'cancelled');
    await runner.stop();
  });

  it('of another organisation changes nothing', async () => {
    const id = await aJob('theirs');
    const elsewhere = await makeOrganisation(test, { name: 'Elsewhere', kind: 'contractor' });
    await cancel(id, elsewhere.id);
    expect(await stateOf(id)).toBe('waiting');
  });
});

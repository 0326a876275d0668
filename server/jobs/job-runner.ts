import { eq, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { jobs } from '../db/schema/work';
import type { Deps } from '../deps';
import { Problem } from '../problem';
import type { JobContext, JobHandler } from './job-handlers';
import { claimJob, heldBy, JobInterrupted, type JobRow, renewLease } from './job-leases';

interface RunnerOptions {
  deps: Deps;
  handlers: Record<string, JobHandler>;
  /** Names this runner in the leases. */
  owner: string;
  concurrency?: number;
  pollMs?: number;
  heartbeatMs?: number;
}

const maximumAttempts = 4;

export interface JobRunner {
  start(): void;
  wake(): void;
  /** Lets go of what runs: another server, or the next start, resumes it. */
  stop(): Promise<void>;
}

export function createJobRunner(options: RunnerOptions): JobRunner {
  const { deps, handlers, owner, concurrency = 2, pollMs = 2_000, heartbeatMs = 1_500 } = options;
  const running = new Map<string, { abort: AbortController; ended: Promise<void> }>();
  let timer: NodeJS.Timeout | undefined;
  let stopped = false;
  let looking: Promise<void> | null = null;
  let lookAgain = false;

  function wake(): void {
    if (stopped) return;
    if (looking) {
      lookAgain = true;
      return;
    }
    looking = look()
      .catch((error) => deps.log.error({ err: error }, 'jobs could not be claimed'))
      .finally(() => {
        looking = null;
        if (lookAgain) {
          lookAgain = false;
          wake();
        }
      });
  }

  async function look(): Promise<void> {
    while (!stopped && running.size < concurrency) {
      const job = await claimJob(deps.db, { owner, kinds: Object.keys(handlers) });
      if (!job) return;
      const abort = new AbortController();
      const ended = runJob({ deps, handler: handlers[job.kind]!, job, owner, abort, heartbeatMs }).finally(
        () => {
          running.delete(job.id);
          wake();
        },
      );
      running.set(job.id, { abort, ended });
    }
  }

  return {
    start() {
      timer = setInterval(wake, pollMs);
      wake();
    },
    wake,
    async stop() {
      stopped = true;
      clearInterval(timer);
      await looking;
      for (const { abort } of running.values()) abort.abort();
      await Promise.all([...running.values()].map(({ ended }) => ended));
    },
  };
}

interface Run {
  deps: Deps;
  handler: JobHandler;
  job: JobRow;
  owner: string;
  abort: AbortController;
  heartbeatMs: number;
}

async function runJob({ deps, handler, job, owner, abort, heartbeatMs }: Run): Promise<void> {
  const heartbeat = setInterval(() => {
    renewLease(deps.db, { id: job.id, owner }).then(
      (held) => held || abort.abort(),
      (error) => deps.log.warn({ err: error, job: job.id }, 'lease not renewed'),
    );
  }, heartbeatMs);
  try {
    if (job.attempts > maximumAttempts) throw new Error(`gave up after ${maximumAttempts} attempts`);
    await handler(jobContext({ deps, job, owner, abort }));
    await finish(deps.db, { id: job.id, owner, now: deps.now() });
  } catch (error) {
    await settle({ deps, job, owner, error, interrupted: abort.signal.aborted });
  } finally {
    clearInterval(heartbeat);
  }
}

function jobContext({ deps, job, owner, abort }: Omit<Run, 'handler' | 'heartbeatMs'>): JobContext {
  const stopIfInterrupted = () => {
    if (abort.signal.aborted) throw new JobInterrupted();
  };
  return {
    deps,
    job,
    signal: abort.signal,
    async report({ text, ...numbers }) {
      stopIfInterrupted();
      const held = await renewLease(deps.db, { id: job.id, owner });
      if (!held) abort.abort();
      stopIfInterrupted();
      await deps.db
        .update(jobs)
        .set({ ...numbers, ...(text === undefined ? {} : { progress: text }) })
        .where(heldBy(job.id, owner));
    },
    async complete(tx, progress) {
      stopIfInterrupted();
      const [result] = await tx
        .update(jobs)
        .set({ ...ended(deps.now()), state: 'done', ...(progress === undefined ? {} : { progress }) })
        .where(heldBy(job.id, owner));
      if (result.affectedRows !== 1) throw new JobInterrupted();
    },
  };
}

/** For handlers without a transaction of their own; a no-op where `complete` was called. */
async function finish(
  db: Database,
  { id, owner, now }: { id: string; owner: string; now: Date },
): Promise<void> {
  await db
    .update(jobs)
    .set({ ...ended(now), state: 'done' })
    .where(heldBy(id, owner));
}

/** Whoever would cancel it must know that it has ended. */
const nextVersion = sql`${jobs.version} + 1`;

function ended(now: Date) {
  return {
    owner: null,
    leaseUntil: null,
    finishedAt: now,
    done: sql`greatest(${jobs.done}, ${jobs.total})`,
    version: nextVersion,
  };
}

interface Settling {
  deps: Deps;
  job: JobRow;
  owner: string;
  error: unknown;
  interrupted: boolean;
}

async function settle({ deps, job, owner, error, interrupted }: Settling): Promise<void> {
  const [present] = await deps.db.select().from(jobs).where(eq(jobs.id, job.id)).limit(1);
  if (!present || present.owner !== owner || present.state !== 'running') return;
  const letGo = { owner: null, leaseUntil: null };
  if (present.cancelRequested) {
    await deps.db
      .update(jobs)
      .set({
        ...letGo,
        state: 'cancelled',
        progress: 'Cancelled.',
        finishedAt: deps.now(),
        version: nextVersion,
      })
      .where(heldBy(job.id, owner));
    return;
  }
  if (interrupted || error instanceof JobInterrupted) {
    const attempts = sql`${jobs.attempts} - 1`;
    await deps.db
      .update(jobs)
      .set({ ...letGo, attempts, state: 'waiting' })
      .where(heldBy(job.id, owner));
    return;
  }
  if (!(error instanceof Problem)) deps.log.error({ err: error, job: job.id, kind: job.kind }, 'job failed');
  if (!(error instanceof Problem) && job.attempts < maximumAttempts) {
    await deps.db
      .update(jobs)
      .set({ ...letGo, state: 'waiting' })
      .where(heldBy(job.id, owner));
    return;
  }
  const { detail, fix } = (error instanceof Problem ? error : new Problem('internal')).body('');
  const problem = {
    slug: error instanceof Problem ? error.slug : 'internal',
    detail,
    fix,
    href: hrefOf(error),
  };
  await deps.db
    .update(jobs)
    .set({
      ...letGo,
      state: 'failed',
      problem,
      progress: detail.slice(0, 300),
      finishedAt: deps.now(),
      version: nextVersion,
    })
    .where(heldBy(job.id, owner));
}

/** Where the remedy is, if the problem names an address. */
function hrefOf(error: unknown): string | null {
  if (!(error instanceof Problem)) return null;
  const { present } = error.details;
  if (typeof present !== 'object' || present === null || !('href' in present)) return null;
  return typeof present.href === 'string' ? present.href : null;
}

import { and, eq, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { jobs } from '../db/schema/work';

interface Cancellation {
  id: string;
  /** The organisation that the job belongs to. */
  organisationId: string;
  /** As the canceller saw it; whoever puts other work in its place need not have seen it. */
  version?: number;
  now: Date;
}

/**
 * A waiting job ends at once; a running one at its next heartbeat. One that has ended stays as it is. False where
 * nothing was cancelled.
 */
export async function cancelJob(
  db: Database,
  { id, organisationId, version, now }: Cancellation,
): Promise<boolean> {
  const own = and(
    eq(jobs.id, id),
    eq(jobs.organisationId, organisationId),
    version === undefined ? undefined : eq(jobs.version, version),
  );
  const next = sql`${jobs.version} + 1`;
  const [ended] = await db
    .update(jobs)
    .set({ state: 'cancelled', progress: 'Cancelled.', finishedAt: now, version: next })
    .where(and(own, eq(jobs.state, 'waiting')));
  if (ended.affectedRows === 1) return true;
  const [asked] = await db
    .update(jobs)
    .set({ cancelRequested: true, version: next })
    .where(and(own, eq(jobs.state, 'running')));
  return asked.affectedRows === 1;
}

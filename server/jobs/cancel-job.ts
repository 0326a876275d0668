import { and, eq } from 'drizzle-orm';
import type { Database } from '../db/client';
import { jobs } from '../db/schema/work';

interface Cancellation {
  id: string;
  /** The organisation that the job belongs to. */
  organisationId: string;
  now: Date;
}

/** A waiting job ends at once; a running one at its next heartbeat. One that has ended stays as it is. */
export async function cancelJob(db: Database, { id, organisationId, now }: Cancellation): Promise<void> {
  const own = and(eq(jobs.id, id), eq(jobs.organisationId, organisationId));
  await db
    .update(jobs)
    .set({ state: 'cancelled', progress: 'Cancelled.', finishedAt: now })
    .where(and(own, eq(jobs.state, 'waiting')));
  await db
    .update(jobs)
    .set({ cancelRequested: true })
    .where(and(own, eq(jobs.state, 'running')));
}

import { and, asc, eq, inArray, or, type SQL, sql } from 'drizzle-orm';
import type { Database } from '../db/client';
import { jobs } from '../db/schema/work';

export type JobRow = typeof jobs.$inferSelect;

const leaseSeconds = 15;
const leaseEnd = sql`utc_timestamp(3) + interval ${leaseSeconds} second`;
/** Waiting, or left behind by a server that has not renewed its lease. */
const claimable = or(
  eq(jobs.state, 'waiting'),
  and(eq(jobs.state, 'running'), sql`${jobs.leaseUntil} < utc_timestamp(3)`),
) as SQL;

interface ClaimOptions {
  owner: string;
  kinds: readonly string[];
}

/** Claims one job by a committed conditional update; null where there is none, or others were faster. */
export async function claimJob(db: Database, { owner, kinds }: ClaimOptions): Promise<JobRow | null> {
  if (kinds.length === 0) return null;
  const candidates = await db
    .select({ id: jobs.id })
    .from(jobs)
    .where(and(claimable, inArray(jobs.kind, [...kinds])))
    .orderBy(asc(jobs.createdAt), asc(jobs.id))
    .limit(5);
  for (const { id } of candidates) {
    const [result] = await db
      .update(jobs)
      .set({ state: 'running', owner, leaseUntil: leaseEnd, attempts: sql`${jobs.attempts} + 1` })
      .where(and(eq(jobs.id, id), claimable));
    if (result.affectedRows !== 1) continue;
    const [row] = await db.select().from(jobs).where(eq(jobs.id, id)).limit(1);
    return row ?? null;
  }
  return null;
}

/** False once the job is somebody else's, ended or to be cancelled. */
export async function renewLease(
  db: Database,
  { id, owner }: { id: string; owner: string },
): Promise<boolean> {
  const [result] = await db
    .update(jobs)
    .set({ leaseUntil: leaseEnd })
    .where(and(heldBy(id, owner), eq(jobs.cancelRequested, false)));
  return result.affectedRows === 1;
}

export function heldBy(id: string, owner: string): SQL | undefined {
  return and(eq(jobs.id, id), eq(jobs.owner, owner), eq(jobs.state, 'running'));
}

/** The lease was lost, or the job is to be cancelled: what was begun must not be written. */
export class JobInterrupted extends Error {}

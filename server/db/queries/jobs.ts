import { and, desc, eq, inArray } from 'drizzle-orm';
import type { Database } from '../client';
import { jobs } from '../schema/work';

export type JobRow = typeof jobs.$inferSelect;

/** The newest job of the organisation about an object, whatever its state. */
export async function newestJobOf(
  db: Database,
  organisationId: string,
  { subjectKind, subjectId }: { subjectKind: string; subjectId: string },
): Promise<JobRow | null> {
  const [row] = await db
    .select()
    .from(jobs)
    .where(
      and(
        eq(jobs.organisationId, organisationId),
        eq(jobs.subjectKind, subjectKind),
        eq(jobs.subjectId, subjectId),
      ),
    )
    .orderBy(desc(jobs.createdAt), desc(jobs.id))
    .limit(1);
  return row ?? null;
}

/** Newest job of each of several objects. */
export async function newestJobsOf(
  db: Database,
  organisationId: string,
  subjectKind: string,
  subjectIds: string[],
): Promise<Map<string, JobRow>> {
  if (subjectIds.length === 0) return new Map();
  const rows = await db
    .select()
    .from(jobs)
    .where(
      and(
        eq(jobs.organisationId, organisationId),
        eq(jobs.subjectKind, subjectKind),
        inArray(jobs.subjectId, subjectIds),
      ),
    )
    .orderBy(jobs.createdAt, jobs.id);
  return new Map(rows.map((row) => [row.subjectId, row]));
}

/** A job of the organisation, or null. */
export async function findJob(db: Database, organisationId: string, jobId: string): Promise<JobRow | null> {
  const [row] = await db
    .select()
    .from(jobs)
    .where(and(eq(jobs.id, jobId), eq(jobs.organisationId, organisationId)));
  return row ?? null;
}

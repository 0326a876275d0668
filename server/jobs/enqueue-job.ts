import type { Database } from '../db/client';
import { jobs } from '../db/schema/work';

interface NewJob {
  id: string;
  /** The organisation that may see and cancel it. */
  organisationId: string;
  kind: string;
  /** What it is about; the page of that object watches it. */
  subject: { kind: string; id: string };
  payload: Record<string, unknown>;
  progress?: string;
  total?: number;
  createdById: string | null;
  createdAt: Date;
}

/** Writes the job in the caller's transaction; wake the runner after the commit. */
export async function enqueueJob(db: Database, job: NewJob): Promise<void> {
  await db.insert(jobs).values({
    id: job.id,
    organisationId: job.organisationId,
    kind: job.kind,
    state: 'waiting',
    subjectKind: job.subject.kind,
    subjectId: job.subject.id,
    payload: job.payload,
    progress: job.progress ?? 'Waiting to start.',
    total: job.total ?? 0,
    createdById: job.createdById,
    createdAt: job.createdAt,
  });
}

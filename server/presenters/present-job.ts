import type { Job } from '#shared/contracts/submittals';
import type { JobRow } from '../db/queries/jobs';

export function presentJob({ id, kind, state, progress, done, total, problem, version }: JobRow): Job {
  return { id, kind, state, progress, done, total, problem, version };
}

export function isActive(job: Pick<JobRow, 'state'> | null): boolean {
  return job?.state === 'waiting' || job?.state === 'running';
}

import { problemTypes } from '#shared/contracts/problems';
import type { Job } from '#shared/contracts/submittals';
import { Problem } from '../../../lib/problem';

/** A failed job told as every other problem is: place and remedy. */
export function problemOfJob(job: Pick<Job, 'id' | 'problem'>): Problem {
  const slug = job.problem?.slug ?? 'internal';
  const known = Object.entries(problemTypes).find(([name]) => name === slug)?.[1] ?? problemTypes.internal;
  return new Problem({
    type: `/problems/${slug}`,
    title: known.title,
    status: known.status,
    detail: job.problem?.detail ?? known.title,
    fix: job.problem?.fix ?? known.fix,
    requestId: job.id,
  });
}

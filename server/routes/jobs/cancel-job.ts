import { cancelJob } from '#shared/contracts/submittals';
import { findJob } from '../../db/queries/jobs';
import { cancelJob as cancel } from '../../jobs/cancel-job';
import { expectVersion } from '../../middleware/if-match';
import { preparesSubmittals } from '../../policies/actor';
import { isActive, presentJob } from '../../presenters/present-job';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const cancelJobRoute = route(cancelJob, async ({ deps, params: { jobId }, version, actor }) => {
  const job = await findJob(deps.db, actor.organisationId, jobId);
  if (job === null) throw new Problem('not-found');
  if (job.kind === 'read' && !preparesSubmittals(actor)) throw new Problem('not-allowed');
  expectVersion(version, presentJob(job));
  const { organisationId } = actor;
  const cancelled = await cancel(deps.db, { id: jobId, organisationId, version, now: deps.now() });
  const present = presentJob((await findJob(deps.db, organisationId, jobId)) ?? job);
  if (!cancelled && isActive(job)) throw new Problem('version-stale', { present });
  return present;
});

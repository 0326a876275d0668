import { cancelJob } from '#shared/contracts/submittals';
import { findJob } from '../../db/queries/jobs';
import { cancelJob as cancel } from '../../jobs/cancel-job';
import { preparesSubmittals } from '../../policies/actor';
import { presentJob } from '../../presenters/present-job';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const cancelJobRoute = route(cancelJob, async ({ deps, params: { jobId }, actor }) => {
  const job = await findJob(deps.db, actor.organisationId, jobId);
  if (job === null) throw new Problem('not-found');
  if (job.kind === 'read' && !preparesSubmittals(actor)) throw new Problem('not-allowed');
  await cancel(deps.db, { id: jobId, organisationId: actor.organisationId, now: deps.now() });
  return presentJob((await findJob(deps.db, actor.organisationId, jobId)) ?? job);
});

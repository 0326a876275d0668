import { getRevision, getSubmittal } from '#shared/contracts/submittals';
import { latestVisibleNumber } from '../../db/queries/revisions';
import { Problem } from '../../problem';
import { route } from '../define-route';
import { viewRevisionAt } from './load-revision';

export const getRevisionRoute = route(getRevision, async ({ deps, params, actor }) =>
  viewRevisionAt(deps, actor, params),
);

export const getSubmittalRoute = route(getSubmittal, async ({ deps, params: { submittalId }, actor }) => {
  const number = await latestVisibleNumber(deps.db, actor, submittalId);
  if (number === null) throw new Problem('not-found');
  return viewRevisionAt(deps, actor, { submittalId, number });
});

import { getSetUp } from '#shared/contracts/session';
import { setUpLinkHolds } from '../../commands/set-up-agency';
import { Problem } from '../../problem';
import { openRoute } from '../define-route';

export const getSetUpRoute = openRoute(getSetUp, async ({ deps, params, http }) => {
  await deps.rateLimits.use('openByAddress', http.request.ip ?? '');
  if (!(await setUpLinkHolds(deps, params.token))) throw new Problem('link-used');
  return { holds: true as const };
});

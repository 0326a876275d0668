import { setUp } from '#shared/contracts/session';
import { signInWithPassword } from '../../auth/sign-in';
import { setUpAgency } from '../../commands/set-up-agency';
import { onlyOrganisationOf } from '../../db/queries/memberships';
import { openRoute } from '../define-route';
import { viewSession } from '../session/view-session';

export const setUpRoute = openRoute(setUp, async ({ deps, params, body, requestId, http }) => {
  await setUpAgency(deps, { ...body, token: params.token, requestId });
  const person = await signInWithPassword(deps, http, body);
  return viewSession(deps, {
    person,
    activeOrganisationId: await onlyOrganisationOf(deps.db, person.id),
  });
});

import { signIn } from '#shared/contracts/session';
import { signInWithPassword } from '../../auth/sign-in';
import { onlyOrganisationOf } from '../../db/queries/memberships';
import { presentSession } from '../../presenters/present-session';
import { openRoute } from '../define-route';

export const signInRoute = openRoute(signIn, async ({ deps, body, http }) => {
  const person = await signInWithPassword(deps, http, body);
  return presentSession(deps, {
    person,
    activeOrganisationId: await onlyOrganisationOf(deps.db, person.id),
  });
});

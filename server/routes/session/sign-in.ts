import { signIn } from '#shared/contracts/session';
import { signInWithPassword } from '../../auth/sign-in';
import { onlyOrganisationOf } from '../../db/queries/memberships';
import { openRoute } from '../define-route';
import { viewSession } from './view-session';

export const signInRoute = openRoute(signIn, async ({ deps, body, http }) => {
  const person = await signInWithPassword(deps, http, body);
  return viewSession(deps, {
    person,
    activeOrganisationId: await onlyOrganisationOf(deps.db, person.id),
  });
});

import { getInvitation } from '#shared/contracts/people';
import { loadInvitation } from '../../commands/people/accept-invitation';
import { openRoute } from '../define-route';

export const getInvitationRoute = openRoute(getInvitation, async ({ deps, params, http }) => {
  await deps.rateLimits.use('openByAddress', http.request.ip ?? '');
  const { invitation, person } = await loadInvitation(deps, params.token);
  return {
    organisation: invitation.organisation,
    kind: invitation.kind,
    name: invitation.name,
    email: invitation.email,
    roles: invitation.roles,
    known: person !== null,
  };
});

import { withdrawInvitation as withdrawEndpoint } from '#shared/contracts/people';
import { withdrawInvitation } from '../../commands/people/withdraw-invitation';
import { listOpenInvitations } from '../../db/queries/people';
import { allow } from '../../policies/allow';
import { managesPeople } from '../../policies/session-abilities';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const withdrawInvitationRoute = route(
  withdrawEndpoint,
  async ({ deps, actor, params: { invitationId }, requestId }) => {
    const { organisationId } = actor;
    const open = await listOpenInvitations(deps.db, { organisationId, now: deps.now() });
    if (!open.some((each) => each.id === invitationId)) throw new Problem('not-found');
    allow(managesPeople(actor));
    await withdrawInvitation(deps, { actor, invitationId, requestId });
    return undefined;
  },
);

import { withdrawInvitation as withdrawEndpoint } from '#shared/contracts/people';
import { withdrawInvitation } from '../../commands/people/withdraw-invitation';
import { listOpenInvitations } from '../../db/queries/people';
import { expectVersion } from '../../middleware/if-match';
import { allow } from '../../policies/allow';
import { managesPeople } from '../../policies/session-abilities';
import { presentInvitation } from '../../presenters/present-person';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const withdrawInvitationRoute = route(
  withdrawEndpoint,
  async ({ deps, actor, params: { invitationId }, version, requestId }) => {
    const { organisationId } = actor;
    const open = await listOpenInvitations(deps.db, { organisationId, now: deps.now() });
    const invitation = open.find((each) => each.id === invitationId);
    if (!invitation) throw new Problem('not-found');
    allow(managesPeople(actor));
    expectVersion(version, presentInvitation(invitation));
    await withdrawInvitation(deps, { actor, invitationId, version, requestId });
    return undefined;
  },
);

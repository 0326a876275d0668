import { acceptInvitation as acceptEndpoint } from '#shared/contracts/people';
import { activateOrganisation } from '../../auth/activate-organisation';
import { signInWithPassword } from '../../auth/sign-in';
import { acceptInvitation, loadInvitation } from '../../commands/people/accept-invitation';
import { openRoute } from '../define-route';
import { viewSession } from '../session/view-session';

export const acceptInvitationRoute = openRoute(
  acceptEndpoint,
  async ({ deps, params: { token }, body, requestId, http }) => {
    const { invitation, person: known } = await loadInvitation(deps, token);
    const credentials = { email: invitation.email, password: body.password };
    const before = known ? await signInWithPassword(deps, http, credentials) : null;
    const { organisationId } = await acceptInvitation(deps, { ...body, token, requestId });
    const person = before ?? (await signInWithPassword(deps, http, credentials));
    await activateOrganisation(deps, { organisationId, http });
    return viewSession(deps, { person, activeOrganisationId: organisationId });
  },
);

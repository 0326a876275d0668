import { fromNodeHeaders } from 'better-auth/node';
import { chooseOrganisation } from '#shared/contracts/session';
import { isMember } from '../../db/queries/memberships';
import { presentSession } from '../../presenters/present-session';
import { Problem } from '../../problem';
import { personRoute } from '../define-route';

export const chooseOrganisationRoute = personRoute(
  chooseOrganisation,
  async ({ deps, body: { organisationId }, signedIn, http }) => {
    const { person } = signedIn;
    if (!(await isMember(deps.db, { personId: person.id, organisationId }))) throw new Problem('not-found');
    await deps.auth.api.setActiveOrganization({
      body: { organizationId: organisationId },
      headers: fromNodeHeaders(http.request.headers),
    });
    return presentSession(deps, { person, activeOrganisationId: organisationId });
  },
);

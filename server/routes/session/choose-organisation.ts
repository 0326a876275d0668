import { fromNodeHeaders } from 'better-auth/node';
import { chooseOrganisation } from '#shared/contracts/session';
import { isMember } from '../../db/queries/memberships';
import { Problem } from '../../problem';
import { personRoute } from '../define-route';
import { viewSession } from './view-session';

export const chooseOrganisationRoute = personRoute(
  chooseOrganisation,
  async ({ deps, body: { organisationId }, signedIn, http }) => {
    const { person } = signedIn;
    if (!(await isMember(deps.db, { personId: person.id, organisationId }))) throw new Problem('not-found');
    await deps.auth.api.setActiveOrganization({
      body: { organizationId: organisationId },
      headers: fromNodeHeaders(http.request.headers),
    });
    return viewSession(deps, { person, activeOrganisationId: organisationId });
  },
);

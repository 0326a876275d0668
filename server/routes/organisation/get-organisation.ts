import { getOrganisation } from '#shared/contracts/organisation';
import { presentOrganisation } from '../../presenters/present-organisation';
import { route } from '../define-route';

export const getOrganisationRoute = route(getOrganisation, async ({ actor }) =>
  presentOrganisation(actor.organisation, actor),
);

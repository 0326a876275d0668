import { changeOrganisation as changeEndpoint } from '#shared/contracts/organisation';
import { changeOrganisation } from '../../commands/organisation/change-organisation';
import { allow } from '../../policies/allow';
import { managesOrganisation } from '../../policies/session-abilities';
import { presentOrganisation } from '../../presenters/present-organisation';
import { route } from '../define-route';

export const changeOrganisationRoute = route(
  changeEndpoint,
  async ({ deps, actor, body, version, requestId }) => {
    allow(managesOrganisation(actor));
    const changed = await changeOrganisation(deps, { actor, version, fields: body, requestId });
    return presentOrganisation(changed, actor);
  },
);

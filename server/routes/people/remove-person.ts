import { removePerson } from '#shared/contracts/people';
import { removeMember } from '../../commands/people/change-membership';
import { findMember } from '../../db/queries/people';
import { allow } from '../../policies/allow';
import { managesPeople } from '../../policies/session-abilities';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const removePersonRoute = route(
  removePerson,
  async ({ deps, actor, params: { membershipId }, version, requestId }) => {
    const { organisationId } = actor;
    if (!(await findMember(deps.db, { membershipId, organisationId }))) throw new Problem('not-found');
    allow(managesPeople(actor));
    await removeMember(deps, { actor, membershipId, version, requestId });
    return undefined;
  },
);

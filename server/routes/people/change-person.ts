import { changePerson } from '#shared/contracts/people';
import { changeRoles } from '../../commands/people/change-membership';
import { findMember, listMembers } from '../../db/queries/people';
import { allow } from '../../policies/allow';
import { managesPeople } from '../../policies/session-abilities';
import { isOnlyAdministrator, presentPerson } from '../../presenters/present-person';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const changePersonRoute = route(
  changePerson,
  async ({ deps, actor, params: { membershipId }, body, version, requestId }) => {
    const { organisationId } = actor;
    if (!(await findMember(deps.db, { membershipId, organisationId }))) throw new Problem('not-found');
    allow(managesPeople(actor));
    await changeRoles(deps, { actor, membershipId, version, roles: body.roles, requestId });
    const all = await listMembers(deps.db, organisationId);
    const member = all.find((each) => each.membershipId === membershipId);
    if (!member) throw new Problem('not-found');
    return presentPerson(member, { actor, onlyAdministrator: isOnlyAdministrator(member, all) });
  },
);

import { listPeople } from '#shared/contracts/people';
import { listMembers, listOpenInvitations } from '../../db/queries/people';
import { managesPeople } from '../../policies/session-abilities';
import { isOnlyAdministrator, presentInvitation, presentPerson } from '../../presenters/present-person';
import { route } from '../define-route';

export const listPeopleRoute = route(listPeople, async ({ deps, actor }) => {
  const { organisationId } = actor;
  const all = await listMembers(deps.db, organisationId);
  const invitations = managesPeople(actor)
    ? await listOpenInvitations(deps.db, { organisationId, now: deps.now() })
    : [];
  return {
    people: all.map((member) =>
      presentPerson(member, { actor, onlyAdministrator: isOnlyAdministrator(member, all) }),
    ),
    invitations: invitations.map(presentInvitation),
  };
});

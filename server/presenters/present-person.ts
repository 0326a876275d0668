import type { Invitation, Person } from '#shared/contracts/people';
import type { InvitationRow, MemberRow } from '../db/queries/people';
import type { Actor } from '../policies/actor';
import { managesPeople } from '../policies/session-abilities';

/** `onlyAdministrator`: the last one stays, or nobody could let anybody in again. */
export function presentPerson(
  member: MemberRow,
  { actor, onlyAdministrator }: { actor: Actor; onlyAdministrator: boolean },
): Person {
  const manages = managesPeople(actor);
  return { ...member, abilities: { change: manages, remove: manages && !onlyAdministrator } };
}

export function presentInvitation(invitation: InvitationRow): Invitation {
  return {
    id: invitation.id,
    email: invitation.email,
    name: invitation.name,
    roles: invitation.roles,
    organisation: invitation.organisation,
    invitedOn: invitation.createdAt.toISOString(),
    expiresOn: invitation.expiresAt.toISOString(),
    mail: invitation.mail,
    version: invitation.version,
  };
}

/** True for an administrator beside whom there is no other. */
export function isOnlyAdministrator(member: MemberRow, all: readonly MemberRow[]): boolean {
  const administrators = all.filter((each) => each.roles.includes('administrator'));
  return administrators.length === 1 && administrators[0]?.membershipId === member.membershipId;
}

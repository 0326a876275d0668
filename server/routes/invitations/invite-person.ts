import { invitePerson as inviteEndpoint } from '#shared/contracts/people';
import { refuseForeignRoles } from '../../commands/people/change-membership';
import { invitePerson } from '../../commands/people/invite-person';
import { findContractorOf, hasAdministrator } from '../../db/queries/contractors';
import { listOpenInvitations } from '../../db/queries/people';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { allow } from '../../policies/allow';
import { managesPeople, managesProjects } from '../../policies/session-abilities';
import { presentInvitation } from '../../presenters/present-person';
import { Problem } from '../../problem';
import { route } from '../define-route';

export const invitePersonRoute = route(inviteEndpoint, async ({ deps, actor, body, requestId }) => {
  const { name, email, roles } = body;
  const organisation =
    body.contractorId === null
      ? ownOrganisation(actor)
      : await contractorWithoutAdministrator(deps, actor, body.contractorId);
  refuseForeignRoles(roles, { kind: body.contractorId === null ? actor.kind : 'contractor' });
  if (body.contractorId !== null && roles.some((role) => role !== 'administrator')) {
    const detail = 'An agency invites the administrator of a contractor, who invites all others.';
    throw new Problem('invalid-input', { detail, errors: [{ pointer: '/roles', detail }] });
  }
  const id = await deps.db.transaction((tx) =>
    invitePerson(tx, deps, { actor, organisation, name, email, roles, requestId }),
  );
  const { organisationId } = actor;
  const open = await listOpenInvitations(deps.db, { organisationId, now: deps.now() });
  return presentInvitation(open.find((each) => each.id === id)!);
});

function ownOrganisation(actor: RequestActor) {
  allow(managesPeople(actor));
  return { id: actor.organisationId, name: actor.organisation.name };
}

/** Once a contractor has its administrator, who joins is its own affair. */
async function contractorWithoutAdministrator(deps: Deps, actor: RequestActor, contractorId: string) {
  const contractor = await findContractorOf(deps.db, { agencyId: actor.organisationId, contractorId });
  if (!contractor) throw new Problem('not-found');
  allow(managesProjects(actor));
  if (await hasAdministrator(deps.db, { agencyId: actor.organisationId, contractorId })) {
    throw new Problem('wrong-state', {
      detail: `${contractor.name} has an administrator already.`,
      fix: 'Ask them to invite the person.',
    });
  }
  return contractor;
}

import { listContractorsOf } from '../../db/queries/contractors';
import { agencyContractors, organisations } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';
import { invitePerson } from '../people/invite-person';
import { newOrganisation } from './new-organisation';

interface NewContractor {
  actor: RequestActor;
  name: string;
  administrator: { name: string; email: string };
  requestId: string;
}

/** Makes the contractor, ties it to the agency and invites its administrator, all or nothing. */
export async function addContractor(deps: Deps, contractor: NewContractor): Promise<string> {
  const { actor, name, administrator, requestId } = contractor;
  const agencyId = actor.organisationId;
  return deps.db.transaction(async (tx) => {
    const present = await listContractorsOf(tx, { agencyId, now: deps.now() });
    if (present.some((each) => each.name.toLowerCase() === name.toLowerCase())) {
      const detail = `${name} works with the agency already.`;
      throw new Problem('already-exists', { detail, errors: [{ pointer: '/name', detail }] });
    }
    const id = deps.newId();
    await tx
      .insert(organisations)
      .values(newOrganisation({ id, name, kind: 'contractor', createdAt: deps.now() }));
    await tx
      .insert(agencyContractors)
      .values({ id: deps.newId(), agencyId, contractorId: id, createdAt: deps.now() });
    await writeAudit(tx, deps, {
      actor,
      act: 'contractor added',
      subject: { kind: 'organisation', id },
      detail: { name },
      requestId,
    });
    await invitePerson(tx, deps, {
      actor,
      organisation: { id, name },
      ...administrator,
      roles: ['administrator'],
      requestId,
    });
    return id;
  });
}

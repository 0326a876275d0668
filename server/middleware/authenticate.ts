import { fromNodeHeaders } from 'better-auth/node';
import { and, asc, eq } from 'drizzle-orm';
import type { Request } from 'express';
import type { Role } from '#shared/contracts/roles';
import { rolesFromColumn } from '../db/roles-column';
import { members, organisations } from '../db/schema/people';
import type { Deps } from '../deps';
import type { Actor } from '../policies/actor';
import { Problem } from '../problem';

export interface SignedInPerson {
  id: string;
  name: string;
  email: string;
}

/** Who asks, for which organisation, with which roles in it. */
export interface RequestActor extends Actor {
  person: SignedInPerson;
  organisation: typeof organisations.$inferSelect;
  membershipId: string;
  roles: readonly Role[];
}

export interface Authenticated {
  person: SignedInPerson;
  sessionId: string;
  activeOrganisationId: string | null;
}

export async function authenticate(request: Request, deps: Deps): Promise<Authenticated> {
  const found = await deps.auth.api.getSession({ headers: fromNodeHeaders(request.headers) });
  if (!found) throw new Problem('not-signed-in');
  const { user, session } = found;
  return {
    person: { id: user.id, name: user.name, email: user.email },
    sessionId: session.id,
    activeOrganisationId: session.activeOrganizationId ?? null,
  };
}

/** A membership that has ended ends here too: the session's organisation alone proves nothing. */
export async function actorOf(authenticated: Authenticated, deps: Deps): Promise<RequestActor> {
  const { person, activeOrganisationId } = authenticated;
  if (activeOrganisationId === null) throw new Problem('no-organisation');
  const [row] = await deps.db
    .select({ member: members, organisation: organisations })
    .from(members)
    .innerJoin(organisations, eq(organisations.id, members.organisationId))
    .where(and(eq(members.personId, person.id), eq(members.organisationId, activeOrganisationId)))
    .orderBy(asc(members.id))
    .limit(1);
  if (!row) throw new Problem('no-organisation');
  return {
    person,
    personId: person.id,
    organisation: row.organisation,
    organisationId: row.organisation.id,
    kind: row.organisation.kind,
    membershipId: row.member.id,
    roles: rolesFromColumn(row.member.role),
  };
}

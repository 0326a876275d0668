import { asc, eq } from 'drizzle-orm';
import type { Session } from '#shared/contracts/session';
import { dateOfInstant } from '#shared/format/dates';
import { rolesFromColumn } from '../db/roles-column';
import { members, organisations } from '../db/schema/people';
import type { Deps } from '../deps';
import type { SignedInPerson } from '../middleware/authenticate';
import { sessionAbilities } from '../policies/session-abilities';

interface SessionFacts {
  person: SignedInPerson;
  activeOrganisationId: string | null;
}

export async function presentSession(
  deps: Deps,
  { person, activeOrganisationId }: SessionFacts,
): Promise<Session> {
  const rows = await deps.db
    .select({
      organisationId: organisations.id,
      organisationName: organisations.name,
      kind: organisations.kind,
      timeZone: organisations.timeZone,
      role: members.role,
    })
    .from(members)
    .innerJoin(organisations, eq(organisations.id, members.organisationId))
    .where(eq(members.personId, person.id))
    .orderBy(asc(organisations.name), asc(organisations.id));
  const memberships = rows.map(({ role, timeZone: _zone, ...membership }) => ({
    ...membership,
    roles: rolesFromColumn(role),
  }));
  const active = memberships.find((each) => each.organisationId === activeOrganisationId) ?? null;
  const zone = rows.find((each) => each.organisationId === activeOrganisationId)?.timeZone ?? 'UTC';
  const timeZone = active?.kind === 'agency' ? zone : 'UTC';
  return {
    person: { id: person.id, name: person.name, email: person.email },
    active,
    memberships,
    today: dateOfInstant(deps.now().toISOString(), timeZone),
    timeZone,
    abilities: sessionAbilities(active, { mailIsCaught: deps.settings.smtpUrl === null }),
  };
}

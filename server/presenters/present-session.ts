import type { Session } from '#shared/contracts/session';
import { dateOfInstant } from '#shared/format/dates';
import type { MembershipRow } from '../db/queries/memberships';
import { sessionAbilities } from '../policies/session-abilities';

interface SessionParts {
  person: Session['person'];
  activeOrganisationId: string | null;
  memberships: MembershipRow[];
  now: Date;
  mailIsCaught: boolean;
}

export function presentSession(parts: SessionParts): Session {
  const { person, activeOrganisationId, now, mailIsCaught } = parts;
  const found = parts.memberships.find((each) => each.organisationId === activeOrganisationId);
  const timeZone = found?.timeZone ?? 'UTC';
  const active = found === undefined ? null : presentMembership(found);
  return {
    person: { id: person.id, name: person.name, email: person.email },
    active,
    memberships: parts.memberships.map(presentMembership),
    today: dateOfInstant(now.toISOString(), timeZone),
    timeZone,
    abilities: sessionAbilities(active, { mailIsCaught }),
  };
}

function presentMembership({ timeZone: _, ...membership }: MembershipRow): Session['memberships'][number] {
  return membership;
}

import { and, asc, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { rolesFromColumn } from '../roles-column';
import { members, organisations } from '../schema/people';

export type MembershipRow = Awaited<ReturnType<typeof membershipsOf>>[number];

/** The organisations that a person belongs to, by name, with their roles in each. */
export async function membershipsOf(db: Database, personId: string) {
  const rows = await db
    .select({
      organisationId: organisations.id,
      organisationName: organisations.name,
      kind: organisations.kind,
      timeZone: organisations.timeZone,
      role: members.role,
    })
    .from(members)
    .innerJoin(organisations, eq(organisations.id, members.organisationId))
    .where(eq(members.personId, personId))
    .orderBy(asc(organisations.name), asc(organisations.id));
  return rows.map(({ role, ...membership }) => ({ ...membership, roles: rolesFromColumn(role) }));
}

/** The one organisation of a person who has only one; else null, and the person chooses. */
export async function onlyOrganisationOf(db: Database, personId: string): Promise<string | null> {
  const rows = await db
    .select({ organisationId: members.organisationId })
    .from(members)
    .where(eq(members.personId, personId))
    .limit(2);
  return rows.length === 1 ? (rows[0]?.organisationId ?? null) : null;
}

export async function isMember(
  db: Database,
  { personId, organisationId }: { personId: string; organisationId: string },
): Promise<boolean> {
  const rows = await db
    .select({ id: members.id })
    .from(members)
    .where(and(eq(members.personId, personId), eq(members.organisationId, organisationId)))
    .limit(1);
  return rows.length > 0;
}

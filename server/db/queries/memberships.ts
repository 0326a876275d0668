import { and, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { members } from '../schema/people';

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

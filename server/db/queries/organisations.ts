import { eq } from 'drizzle-orm';
import type { Database } from '../client';
import { organisations } from '../schema/people';

export type OrganisationRow = typeof organisations.$inferSelect;

export async function anyOrganisation(db: Database): Promise<boolean> {
  const rows = await db.select({ id: organisations.id }).from(organisations).limit(1);
  return rows.length > 0;
}

export async function findOrganisation(db: Database, id: string): Promise<OrganisationRow | null> {
  const [row] = await db.select().from(organisations).where(eq(organisations.id, id)).limit(1);
  return row ?? null;
}

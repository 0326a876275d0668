import { asc, count, eq } from 'drizzle-orm';
import type { Database } from '../client';
import { mappings } from '../schema/mappings';
import { laboratories } from '../schema/people';

export async function listLaboratoriesOf(db: Database, organisationId: string) {
  const rows = await db
    .select({
      id: laboratories.id,
      name: laboratories.name,
      accreditation: laboratories.accreditation,
      createdAt: laboratories.createdAt,
      version: laboratories.version,
      mappings: count(mappings.id),
    })
    .from(laboratories)
    .leftJoin(mappings, eq(mappings.laboratoryId, laboratories.id))
    .where(eq(laboratories.organisationId, organisationId))
    .groupBy(laboratories.id)
    .orderBy(asc(laboratories.name), asc(laboratories.id));
  return rows;
}

export type LaboratoryRow = Awaited<ReturnType<typeof listLaboratoriesOf>>[number];

import { and, asc, count, desc, eq, isNull } from 'drizzle-orm';
import type { Database } from '../client';
import { mappingVersions } from '../schema/learning';
import { mappings } from '../schema/mappings';
import { laboratories, people } from '../schema/people';
import { revisions } from '../schema/submittals';

/** The active organisation's own, in use first; a mapping is nobody else's. */
export async function listMappings(db: Database, organisationId: string) {
  const rows = await selectMappings(db)
    .where(eq(mappings.organisationId, organisationId))
    .orderBy(asc(laboratories.name), asc(mappings.name), asc(mappings.id));
  const used = await usesOf(db, organisationId);
  return rows
    .map((row) => ({ ...row, usedBy: used.get(row.mapping.id) ?? 0 }))
    .sort((a, b) => Number(a.mapping.retiredAt !== null) - Number(b.mapping.retiredAt !== null));
}

export type MappingRow = Awaited<ReturnType<typeof listMappings>>[number];

export async function findMapping(
  db: Database,
  organisationId: string,
  mappingId: string,
): Promise<MappingRow | null> {
  const [row] = await selectMappings(db).where(
    and(eq(mappings.id, mappingId), eq(mappings.organisationId, organisationId)),
  );
  if (row === undefined) return null;
  return { ...row, usedBy: (await usesOf(db, organisationId)).get(mappingId) ?? 0 };
}

function selectMappings(db: Database) {
  return db
    .select({
      mapping: mappings,
      laboratory: { id: laboratories.id, name: laboratories.name },
      document: mappingVersions.document,
      changedBy: people.name,
      changedAt: mappingVersions.at,
    })
    .from(mappings)
    .innerJoin(laboratories, eq(laboratories.id, mappings.laboratoryId))
    .innerJoin(
      mappingVersions,
      and(eq(mappingVersions.mappingId, mappings.id), eq(mappingVersions.number, mappings.number)),
    )
    .innerJoin(people, eq(people.id, mappingVersions.personId));
}

/** Revisions that were read with any version of each mapping. */
async function usesOf(db: Database, organisationId: string): Promise<Map<string, number>> {
  const rows = await db
    .select({ id: mappings.id, total: count(revisions.id) })
    .from(mappings)
    .innerJoin(revisions, eq(revisions.mappingId, mappings.id))
    .where(eq(mappings.organisationId, organisationId))
    .groupBy(mappings.id);
  return new Map(rows.map(({ id, total }) => [id, total]));
}

/** Every version, the newest first. */
export function listMappingVersions(db: Database, organisationId: string, mappingId: string) {
  return db
    .select({ version: mappingVersions, by: people.name })
    .from(mappingVersions)
    .innerJoin(people, eq(people.id, mappingVersions.personId))
    .where(and(eq(mappingVersions.mappingId, mappingId), eq(mappingVersions.organisationId, organisationId)))
    .orderBy(desc(mappingVersions.number));
}

export async function findMappingVersion(
  db: Database,
  organisationId: string,
  { mappingId, number }: { mappingId: string; number: number },
) {
  const [row] = await db
    .select({ id: mappings.id, name: mappings.name, version: mappingVersions })
    .from(mappingVersions)
    .innerJoin(mappings, eq(mappings.id, mappingVersions.mappingId))
    .where(
      and(
        eq(mappingVersions.mappingId, mappingId),
        eq(mappingVersions.number, number),
        eq(mappingVersions.organisationId, organisationId),
      ),
    );
  return row ?? null;
}

/** What a laboratory's next workbook may be recognised by; retired mappings are not applied. */
export function layoutsInUse(db: Database, organisationId: string, laboratoryId: string) {
  return db
    .select({
      id: mappings.id,
      name: mappings.name,
      number: mappings.number,
      fingerprint: mappings.fingerprint,
    })
    .from(mappings)
    .where(
      and(
        eq(mappings.organisationId, organisationId),
        eq(mappings.laboratoryId, laboratoryId),
        isNull(mappings.retiredAt),
      ),
    )
    .orderBy(desc(mappings.createdAt), desc(mappings.id));
}

/** The newest version that learned from a revision. */
export async function lastLearnedFrom(db: Database, organisationId: string, revisionId: string) {
  const [row] = await db
    .select({ mapping: mappings, version: mappingVersions })
    .from(mappingVersions)
    .innerJoin(mappings, eq(mappings.id, mappingVersions.mappingId))
    .where(
      and(eq(mappingVersions.revisionId, revisionId), eq(mappingVersions.organisationId, organisationId)),
    )
    .orderBy(desc(mappingVersions.at), desc(mappingVersions.id))
    .limit(1);
  return row ?? null;
}

/** Locks a mapping, so that two revisions of its laboratory add their versions one after the other. */
export async function lockMapping(db: Database, organisationId: string, mappingId: string) {
  const [row] = await db
    .select()
    .from(mappings)
    .where(and(eq(mappings.id, mappingId), eq(mappings.organisationId, organisationId)))
    .for('update');
  return row ?? null;
}

import { eq } from 'drizzle-orm';
import type { Mapping } from '#rules/reading/mapping';
import type { Database } from '../../db/client';
import { mappingVersions } from '../../db/schema/learning';
import { mappings } from '../../db/schema/mappings';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';

interface NewVersion {
  actor: Actor;
  organisationId: string;
  requestId: string;
  version: { document: Mapping; origin: string; revisionId: string | null; learned: string[] };
}

/** Another version of a mapping that its caller has locked; the earlier ones stay. */
export async function addMappingVersion(
  tx: Database,
  deps: Deps,
  { mapping, ...added }: NewVersion & { mapping: typeof mappings.$inferSelect },
): Promise<void> {
  const { document } = added.version;
  await tx
    .update(mappings)
    .set({ number: document.version, fingerprint: document.fingerprint, version: mapping.version + 1 })
    .where(eq(mappings.id, mapping.id));
  await insertVersion(tx, deps, { ...added, mappingId: mapping.id });
}

/** A mapping of a layout that the laboratory had none for. */
export async function addMapping(
  tx: Database,
  deps: Deps,
  { laboratoryId, name, ...added }: NewVersion & { laboratoryId: string; name: string },
): Promise<string> {
  const id = deps.newId();
  await tx.insert(mappings).values({
    id,
    organisationId: added.organisationId,
    laboratoryId,
    name,
    fingerprint: added.version.document.fingerprint,
    number: added.version.document.version,
    createdById: added.actor.personId,
    createdAt: deps.now(),
  });
  await insertVersion(tx, deps, { ...added, mappingId: id });
  return id;
}

async function insertVersion(
  tx: Database,
  deps: Deps,
  { mappingId, actor, organisationId, requestId, version }: NewVersion & { mappingId: string },
): Promise<void> {
  const { document } = version;
  await tx.insert(mappingVersions).values({
    id: deps.newId(),
    mappingId,
    organisationId,
    number: document.version,
    fingerprint: document.fingerprint,
    ...version,
    personId: actor.personId,
    at: deps.now(),
  });
  await writeAudit(tx, deps, {
    actor,
    act: 'mapping changed',
    subject: { kind: 'mapping', id: mappingId },
    detail: { version: document.version, origin: version.origin, rules: document.rules.length },
    requestId,
  });
}

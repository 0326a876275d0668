import { and, eq } from 'drizzle-orm';
import { mappings } from '../../db/schema/mappings';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';

interface MappingChange {
  actor: Actor;
  requestId: string;
  mapping: typeof mappings.$inferSelect;
  version: number;
  name?: string | undefined;
  retired?: boolean | undefined;
}

/** Another name, or out of use and into it again. Its versions stay, and so does what was read with them. */
export async function changeMapping(deps: Deps, change: MappingChange): Promise<void> {
  const { actor, requestId, mapping, version, name = mapping.name } = change;
  const isRetired = change.retired ?? mapping.retiredAt !== null;
  await deps.db.transaction(async (tx) => {
    expectWritten(
      await tx
        .update(mappings)
        .set({
          name,
          retiredAt: isRetired ? (mapping.retiredAt ?? deps.now()) : null,
          version: version + 1,
        })
        .where(
          and(
            eq(mappings.id, mapping.id),
            eq(mappings.organisationId, actor.organisationId),
            eq(mappings.version, version),
          ),
        ),
    );
    await writeAudit(tx, deps, {
      actor,
      act: 'mapping kept',
      subject: { kind: 'mapping', id: mapping.id },
      detail: { name, retired: isRetired },
      requestId,
    });
  });
}

import { isDuplicateEntry } from '../../db/duplicate-entry';
import type { LaboratoryRow } from '../../db/queries/laboratories';
import { laboratories } from '../../db/schema/people';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';

interface NewLaboratory {
  actor: Actor;
  name: string;
  accreditation: string | null;
  requestId: string;
}

export async function addLaboratory(deps: Deps, laboratory: NewLaboratory): Promise<LaboratoryRow> {
  const { actor, name, accreditation, requestId } = laboratory;
  const row = { id: deps.newId(), name, accreditation, createdAt: deps.now(), version: 1 };
  await deps.db.transaction(async (tx) => {
    try {
      await tx.insert(laboratories).values({ ...row, organisationId: actor.organisationId });
    } catch (error) {
      if (!isDuplicateEntry(error)) throw error;
      const detail = `There is a laboratory ${name} already.`;
      throw new Problem('already-exists', { detail, errors: [{ pointer: '/name', detail }] });
    }
    await writeAudit(tx, deps, {
      actor,
      act: 'laboratory added',
      subject: { kind: 'laboratory', id: row.id },
      detail: { name },
      requestId,
    });
  });
  return { ...row, mappings: 0 };
}

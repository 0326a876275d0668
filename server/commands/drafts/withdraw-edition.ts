import { listEditions } from '../../db/queries/editions';
import { editionEvents } from '../../db/schema/rule-sets';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { RequestActor } from '../../middleware/authenticate';
import { Problem } from '../../problem';

interface Withdrawal {
  actor: RequestActor;
  requestId: string;
  ruleSetId: string;
  edition: string;
  reason: string;
}

/** Sections and checks that name the edition keep it; no new section can take it. */
export async function withdrawEdition(deps: Deps, withdrawal: Withdrawal) {
  const { actor, requestId, ruleSetId, edition, reason } = withdrawal;
  return deps.db.transaction(async (tx) => {
    const published = await listEditions(tx, actor.organisationId);
    const row = published.find((each) => each.ruleSetKey === ruleSetId && each.edition === edition);
    if (row === undefined) throw new Problem('not-found');
    if (row.withdrawn) {
      throw new Problem('wrong-state', {
        detail: `Edition ${edition} is withdrawn already.`,
        fix: 'Nothing is left to do.',
      });
    }
    await tx.insert(editionEvents).values({
      id: deps.newId(),
      editionId: row.id,
      agencyId: actor.organisationId,
      kind: 'withdrawn',
      at: deps.now(),
      personId: actor.personId,
      reason,
    });
    await writeAudit(tx, deps, {
      actor,
      act: 'edition withdrawn',
      subject: { kind: 'edition', id: row.id },
      detail: { ruleSet: ruleSetId, edition, reason },
      requestId,
    });
    return row;
  });
}

import { and, eq } from 'drizzle-orm';
import type { ReturnFields } from '#shared/contracts/returns';
import { findReturn, type ReturnRow } from '../../db/queries/returns';
import type { RevisionRow } from '../../db/queries/revisions';
import { returns } from '../../db/schema/returns';
import type { Deps } from '../../deps';
import { expectVersion, expectWritten } from '../../middleware/if-match';
import { type Actor, signs } from '../../policies/actor';
import { Problem } from '../../problem';

interface KeepReturn {
  actor: Actor;
  row: RevisionRow;
  fields: ReturnFields;
  /** 0 where the writer saw a draft that nobody had kept. */
  seenVersion: number;
}

/** Keeps the draft. What a reviewer changes after it was made ready has to be made ready again. */
export async function keepReturn(
  deps: Deps,
  { actor, row, fields, seenVersion }: KeepReturn,
): Promise<ReturnRow> {
  const kept = await findReturn(deps.db, actor, row.revision.id);
  if (kept?.state === 'sent') throw new Problem('wrong-state', { detail: 'The return has been sent.' });
  expectVersion(seenVersion, kept ?? { version: 0 });
  const values = {
    disposition: fields.disposition,
    reason: fields.reason,
    textAbove: fields.textAbove,
    textBelow: fields.textBelow,
    recipients: fields.to,
    copies: fields.copies,
    included: fields.included,
    findingsWorkbook: fields.findingsWorkbook,
    savedAt: deps.now(),
  };
  if (kept === null) await insertReturn(deps, actor, row, values);
  else {
    const result = await deps.db
      .update(returns)
      .set({ ...values, state: signs(actor) ? kept.state : 'draft', version: kept.version + 1 })
      .where(
        and(
          eq(returns.id, kept.id),
          eq(returns.agencyId, actor.organisationId),
          eq(returns.version, kept.version),
        ),
      );
    expectWritten(result);
  }
  const written = await findReturn(deps.db, actor, row.revision.id);
  if (written === null) throw new Problem('version-stale');
  return written;
}

type KeptValues = Pick<
  typeof returns.$inferInsert,
  | 'disposition'
  | 'reason'
  | 'textAbove'
  | 'textBelow'
  | 'recipients'
  | 'copies'
  | 'included'
  | 'findingsWorkbook'
  | 'savedAt'
>;

/** Of two who keep a first draft at once the second is told that it exists: one return a revision. */
async function insertReturn(deps: Deps, actor: Actor, row: RevisionRow, values: KeptValues): Promise<void> {
  const [result] = await deps.db
    .insert(returns)
    .ignore()
    .values({
      ...values,
      id: deps.newId(),
      submittalId: row.submittal.id,
      revisionId: row.revision.id,
      agencyId: row.agency.id,
      contractorId: row.contractor.id,
      state: 'draft',
      preparedById: actor.personId,
      createdAt: deps.now(),
    });
  if (result.affectedRows !== 1) throw new Problem('version-stale');
}

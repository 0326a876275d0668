import type { CheckResult } from '#rules/engine/finding';
import type { CheckContext } from '#rules/record';
import type { Database } from '../../db/client';
import { nextCheckNumber, removePreChecks } from '../../db/queries/checks';
import type { Reader } from '../../db/queries/reader';
import { checks, findings } from '../../db/schema/checks';
import type { Deps } from '../../deps';

export interface NewCheck {
  reader: Reader;
  revision: { id: string; agencyId: string; contractorId: string };
  kind: 'pre-check' | 'check of record';
  context: CheckContext & { submittedOn: string };
  result: CheckResult;
  /** Null where the product itself runs it. */
  madeById: string | null;
}

const rowsPerInsert = 200;

/**
 * Keeps a check with its evidence and the searchable copy of its findings. A pre-check gives way to whatever
 * comes after it; checks of record stay.
 */
export async function storeCheck(
  tx: Database,
  { now, newId }: Pick<Deps, 'now' | 'newId'>,
  { reader, revision, kind, context, result, madeById }: NewCheck,
): Promise<string> {
  await removePreChecks(tx, reader, revision.id);
  const id = newId();
  const tenant = {
    revisionId: revision.id,
    agencyId: revision.agencyId,
    contractorId: revision.contractorId,
  };
  const { seal, summary } = result;
  await tx.insert(checks).values({
    id,
    ...tenant,
    kind,
    number: await nextCheckNumber(tx, reader, revision.id),
    madeAt: now(),
    madeById,
    submittedOn: context.submittedOn,
    context: { submittedOn: context.submittedOn, lettingOn: context.lettingOn, facts: context.facts },
    recordHash: seal.record,
    resolvedHash: seal.resolvedEdition,
    engineVersion: seal.engine,
    seal: seal.seal,
    summary,
    result,
  });
  const rows = result.findings.map((finding, position) => ({
    id: newId(),
    checkId: id,
    ...tenant,
    position,
    rule: finding.rule,
    subject: finding.subject,
    clause: finding.clause,
    severity: finding.severity,
    outcome: finding.outcome,
    borderline: finding.borderline,
    rounded: finding.observed?.rounded ?? null,
    margin: finding.margin,
  }));
  for (let from = 0; from < rows.length; from += rowsPerInsert) {
    await tx.insert(findings).values(rows.slice(from, from + rowsPerInsert));
  }
  return id;
}

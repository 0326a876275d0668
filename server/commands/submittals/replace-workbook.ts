import { and, eq } from 'drizzle-orm';
import { removePreChecks } from '../../db/queries/checks';
import { newestJobOf } from '../../db/queries/jobs';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { mixRecords, readings, replacedWorkbooks, revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { cancelJob } from '../../jobs/cancel-job';
import { expectWritten } from '../../middleware/if-match';
import type { Actor } from '../../policies/actor';
import { Problem } from '../../problem';
import type { UploadedFile } from '../../uploaded-file';
import { enqueueReading, storeFile, workbookMediaType } from './store-workbook';

interface Replacement {
  actor: Actor;
  requestId: string;
  row: RevisionRow;
  version: number;
  workbook: UploadedFile;
}

/** A draft's new workbook. The old one stays with the contractor; what was read from it goes. */
export async function replaceWorkbook(deps: Deps, replacement: Replacement): Promise<void> {
  const { actor, row, version, workbook } = replacement;
  const { revision } = row;
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, revision.id);
    if (locked?.state !== 'draft')
      throw new Problem('wrong-state', { detail: 'Only a draft takes another workbook.' });
    const now = deps.now();
    const fileId = await storeFile(tx, deps, {
      tenant: revision,
      kind: 'workbook',
      file: workbook,
      mediaType: workbookMediaType(workbook.fileName),
      createdById: actor.personId,
    });
    await tx.insert(replacedWorkbooks).values({
      id: deps.newId(),
      revisionId: revision.id,
      contractorId: revision.contractorId,
      fileId: locked.workbookFileId,
      replacedById: actor.personId,
      replacedAt: now,
    });
    const job = await newestJobOf(tx, actor.organisationId, {
      subjectKind: 'revision',
      subjectId: revision.id,
    });
    if (job !== null) await cancelJob(tx, { id: job.id, organisationId: actor.organisationId, now });
    await removePreChecks(tx, actor, revision.id);
    await tx.delete(mixRecords).where(eq(mixRecords.revisionId, revision.id));
    await tx.delete(readings).where(eq(readings.revisionId, revision.id));
    expectWritten(
      await tx
        .update(revisions)
        .set({
          workbookFileId: fileId,
          uploadedById: actor.personId,
          uploadedAt: now,
          doubtCount: 0,
          changes: null,
          updatedAt: now,
          version: version + 1,
        })
        .where(and(eq(revisions.id, revision.id), eq(revisions.version, version))),
    );
    await tx.update(submittals).set({ updatedAt: now }).where(eq(submittals.id, revision.submittalId));
    await enqueueReading(tx, deps, {
      actor,
      revisionId: revision.id,
      fileId,
      fileName: workbook.fileName,
    });
    await writeAudit(tx, deps, {
      actor,
      act: 'workbook replaced',
      subject: { kind: 'revision', id: revision.id },
      detail: { replaced: row.workbook.sha256 },
      requestId: replacement.requestId,
    });
  });
  deps.wake.jobs();
}

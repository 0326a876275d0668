import { and, eq } from 'drizzle-orm';
import type { Disposition } from '#rules/engine/finding';
import type { Recipient, ReturnFields } from '#shared/contracts/returns';
import { dateOfInstant } from '#shared/format/dates';
import { workingDaysBetween } from '#shared/working-days';
import { findReturn, lockReturn, stampsOfReturned } from '../../db/queries/returns';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { notes, waivers } from '../../db/schema/checks';
import { returns } from '../../db/schema/returns';
import { revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import type { DocumentInput } from '../../documents/document-input';
import { renderFindingsWorkbook } from '../../documents/findings-workbook';
import { letterDefinition } from '../../documents/letter-definition';
import type { LoadedRevision } from '../../documents/load-revision-documents';
import { pdfMediaType, spreadsheetMediaType } from '../../documents/media-types';
import { renderPdf } from '../../documents/render-pdf';
import { enqueueMail } from '../../mail/enqueue-mail';
import { returnMail } from '../../mail/templates/return-mail';
import type { RequestActor } from '../../middleware/authenticate';
import { expectVersion } from '../../middleware/if-match';
import { Problem } from '../../problem';
import { storeFile } from '../submittals/store-workbook';
import { keepReturn } from './keep-return';
import { previewInput } from './preview-input';
import { returnAddress } from './return-address';
import { recommended, refuseUnfinished } from './return-fields';

interface SendReturn {
  actor: RequestActor;
  row: RevisionRow;
  loaded: LoadedRevision;
  fields: ReturnFields;
  seenVersion: number;
  requestId: string;
}

/**
 * Decides, signs and sends. Letter and workbook are rendered from frozen input first, because rendering is slow; then
 * everything is locked, seen to be unchanged, and written together: bytes, decision, mail and the audit entry.
 */
export async function sendReturn(deps: Deps, act: SendReturn): Promise<void> {
  const { actor, row, loaded, fields } = act;
  refuseUnfinished(fields, recommended(loaded));
  const stampsBefore = await stampsOfReturned(deps.db, actor.organisationId, row.revision.id);
  const input = previewInput(deps, act, { name: actor.person.name, function: 'signing engineer' });
  const letter = await renderPdf(letterDefinition(input));
  const workbook = fields.findingsWorkbook ? await renderFindingsWorkbook(input) : null;
  await deps.db.transaction(async (tx) => {
    const inner: Deps = { ...deps, db: tx };
    await lockUnchanged(inner, act, stampsBefore);
    const name = `${row.project.number} ${row.submittal.mixDesignation} r${row.revision.number}`;
    const letterFileId = await storeDocument(inner, act, {
      kind: 'letter',
      fileName: `${name} letter.pdf`,
      mediaType: pdfMediaType,
      bytes: letter,
    });
    const workbookFileId =
      workbook === null
        ? null
        : await storeDocument(inner, act, {
            kind: 'findings workbook',
            fileName: `${name} findings.xlsx`,
            mediaType: spreadsheetMediaType,
            bytes: workbook,
          });
    const returnId = await markSent(inner, act, { input, letterFileId, workbookFileId });
    await decide(inner, act);
    await enqueueMail(tx, inner, {
      organisationId: row.agency.id,
      kind: 'return',
      subject: { kind: 'return', id: returnId },
      submittalId: row.submittal.id,
      recipients: fields.to.map(mailAddress),
      copies: fields.copies.map(mailAddress),
      content: returnMail(input, { address: returnAddress(deps.settings, row) }),
      fileIds: [letterFileId, ...(workbookFileId === null ? [] : [workbookFileId])],
    });
    await writeAudit(tx, inner, {
      actor,
      act: 'return sent',
      subject: { kind: 'revision', id: row.revision.id },
      detail: { disposition: fields.disposition, recommended: recommended(loaded), check: loaded.checkId },
      requestId: act.requestId,
    });
  });
  deps.wake.mail();
}

async function lockUnchanged(
  deps: Deps,
  { actor, row, seenVersion }: SendReturn,
  stampsBefore: string,
): Promise<void> {
  const revision = await lockRevision(deps.db, actor, row.revision.id);
  if (revision === null || revision.state !== 'in review') {
    throw new Problem('wrong-state', { detail: 'The revision is no longer in review.' });
  }
  if (revision.version !== row.revision.version) throw new Problem('version-stale');
  const kept = await lockReturn(deps.db, actor.organisationId, row.revision.id);
  if (kept?.state === 'sent') throw new Problem('wrong-state', { detail: 'The return has been sent.' });
  expectVersion(seenVersion, kept ?? { version: 0 });
  const stamps = await stampsOfReturned(deps.db, actor.organisationId, row.revision.id, { lock: true });
  if (stamps !== stampsBefore) {
    throw new Problem('version-stale', {
      detail: 'A note or a waiver has changed since you saw the letter.',
    });
  }
}

function storeDocument(
  deps: Deps,
  { actor, row }: SendReturn,
  {
    kind,
    mediaType,
    ...file
  }: { kind: 'letter' | 'findings workbook'; fileName: string; mediaType: string; bytes: Buffer },
): Promise<string> {
  return storeFile(deps.db, deps, {
    tenant: { agencyId: row.agency.id, contractorId: row.contractor.id },
    kind,
    file,
    mediaType,
    createdById: actor.personId,
  });
}

async function markSent(
  deps: Deps,
  { actor, row, fields, seenVersion }: SendReturn,
  documents: { input: DocumentInput; letterFileId: string; workbookFileId: string | null },
): Promise<string> {
  if (seenVersion === 0) await keepReturn(deps, { actor, row, fields, seenVersion });
  const kept = await findReturn(deps.db, actor, row.revision.id);
  if (kept === null) throw new Problem('version-stale');
  const now = deps.now();
  await deps.db
    .update(returns)
    .set({
      state: 'sent',
      frozen: documents.input,
      letterFileId: documents.letterFileId,
      workbookFileId: documents.workbookFileId,
      decidedById: actor.personId,
      sentAt: now,
      savedAt: now,
      version: kept.version + 1,
    })
    .where(and(eq(returns.id, kept.id), eq(returns.agencyId, actor.organisationId)));
  return kept.id;
}

/** The revision's decision, the submittal's standing approval, and everything that now reaches the contractor. */
async function decide(deps: Deps, { row, fields }: SendReturn): Promise<void> {
  const now = deps.now();
  const today = dateOfInstant(now.toISOString(), row.agency.timeZone);
  await deps.db
    .update(revisions)
    .set({
      state: 'returned',
      disposition: fields.disposition,
      returnedAt: now,
      workingDaysTaken:
        row.revision.receivedOn === null ? null : workingDaysBetween(row.revision.receivedOn, today),
      updatedAt: now,
      version: row.revision.version + 1,
    })
    .where(and(eq(revisions.id, row.revision.id), eq(revisions.agencyId, row.agency.id)));
  await deps.db
    .update(submittals)
    .set({
      ...(isApproval(fields.disposition)
        ? {
            standingRevision: row.revision.number,
            standingDisposition: fields.disposition,
            standingOn: today,
          }
        : {}),
      ...(fields.disposition === 'rejected' ? { activeDesignation: null } : {}),
      agencyUpdatedAt: now,
      updatedAt: now,
    })
    .where(and(eq(submittals.id, row.submittal.id), eq(submittals.agencyId, row.agency.id)));
  await deps.db
    .update(notes)
    .set({ sentAt: now })
    .where(
      and(eq(notes.revisionId, row.revision.id), eq(notes.side, 'agency'), eq(notes.kind, 'to be returned')),
    );
  await deps.db
    .update(waivers)
    .set({ sentAt: now })
    .where(and(eq(waivers.revisionId, row.revision.id), eq(waivers.toBeReturned, true)));
}

function mailAddress({ name, email }: Recipient): { name: string; email: string } {
  return { name, email };
}

function isApproval(disposition: Disposition): boolean {
  return disposition === 'approved' || disposition === 'approved as noted';
}

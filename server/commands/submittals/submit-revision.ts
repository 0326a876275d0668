import { and, eq, isNull } from 'drizzle-orm';
import { evaluate } from '#rules/engine/evaluate';
import type { CheckResult } from '#rules/engine/finding';
import { dateOfInstant } from '#shared/format/dates';
import { workingDayAfter } from '#shared/working-days';
import type { Database } from '../../db/client';
import { findMixRecord } from '../../db/queries/records';
import { peopleWithRole } from '../../db/queries/returns';
import { lockRevision, type RevisionRow } from '../../db/queries/revisions';
import { snapshotOfSection } from '../../db/queries/section-snapshot';
import { loadResolvedEdition } from '../../db/resolved-edition';
import { notes } from '../../db/schema/checks';
import { revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { enqueueMail } from '../../mail/enqueue-mail';
import { receiptMail, reviewWantedMail } from '../../mail/templates/submission-mails';
import type { RequestActor } from '../../middleware/authenticate';
import { expectWritten } from '../../middleware/if-match';
import { declarationOf } from '../../presenters/declaration-of';
import { Problem } from '../../problem';
import { storeCheck } from '../checks/store-check';

interface Submission {
  actor: RequestActor;
  requestId: string;
  row: RevisionRow;
  version: number;
  /** As they were shown. */
  declaration: string;
  seal: string;
}

/** Runs the check of record, starts the clock and mails both sides, in one transaction. */
export async function submitRevision(deps: Deps, submission: Submission): Promise<void> {
  const { actor, row, version } = submission;
  const { revision, agency } = row;
  await deps.db.transaction(async (tx) => {
    const locked = await lockRevision(tx, actor, revision.id);
    if (locked?.state !== 'draft') {
      throw new Problem('wrong-state', { detail: `Revision ${revision.number} is submitted already.` });
    }
    const { result, context, section } = await checkOfRecord(tx, deps, submission);
    await storeCheck(tx, deps, {
      reader: actor,
      revision,
      kind: 'check of record',
      context,
      result,
      madeById: actor.personId,
    });
    const now = deps.now();
    const receivedOn = context.submittedOn;
    const dueOn = workingDayAfter(receivedOn, agency.reviewWorkingDays);
    expectWritten(
      await tx
        .update(revisions)
        .set({
          state: 'submitted',
          section,
          declaration: submission.declaration,
          submittedById: actor.personId,
          submittedAt: now,
          receivedOn,
          dueOn,
          updatedAt: now,
          version: version + 1,
        })
        .where(and(eq(revisions.id, revision.id), eq(revisions.version, version))),
    );
    await tx
      .update(submittals)
      .set({ updatedAt: now, agencyUpdatedAt: now })
      .where(eq(submittals.id, revision.submittalId));
    await carryReplies(tx, revision.submittalId, now);
    await mailBoth(tx, deps, submission, { result, receivedOn, dueOn });
    await writeAudit(tx, deps, {
      actor,
      act: 'revision submitted',
      subject: { kind: 'revision', id: revision.id },
      detail: { number: revision.number, seal: result.seal.seal, dueOn },
      requestId: submission.requestId,
    });
  });
  deps.wake.mail();
}

/** The check is made again from what is stored; what the contractor declared must be what it says. */
async function checkOfRecord(tx: Database, deps: Deps, { actor, row, declaration, seal }: Submission) {
  const { revision, submittal, project, agency } = row;
  const kept = await findMixRecord(tx, actor, revision.id);
  const section = await snapshotOfSection(tx, actor, {
    projectId: project.id,
    sectionId: submittal.sectionId,
  });
  if (kept === null || section === null) {
    throw new Problem('wrong-state', {
      detail: 'The workbook has not been read and checked.',
      fix: 'Upload a workbook that can be read, look at its findings, then submit.',
    });
  }
  const edition = await loadResolvedEdition(tx, section.resolvedHash);
  const submittedOn = dateOfInstant(deps.now().toISOString(), agency.timeZone);
  const context = { submittedOn, lettingOn: project.lettingOn, facts: project.facts };
  const result = evaluate(kept.record, edition, context);
  const expected = declarationOf({ row, section, findings: result.findings, doubts: kept.record.doubts });
  if (result.seal.seal !== seal || declaration !== expected) throw movedOn(seal, result);
  return { result, context, section };
}

function movedOn(seal: string, { seal: { seal: present } }: CheckResult): Problem {
  return new Problem('wrong-state', {
    detail:
      seal === present
        ? 'The declaration is not the one that these findings call for.'
        : 'The findings are not the ones that were shown: the date, the section or the reading has changed since.',
    fix: 'Check again, look at the findings and the declaration, then submit.',
  });
}

/** Replies written since the last return travel with the submission. */
async function carryReplies(tx: Database, submittalId: string, now: Date): Promise<void> {
  await tx
    .update(notes)
    .set({ sentAt: now })
    .where(
      and(
        eq(notes.submittalId, submittalId),
        eq(notes.side, 'contractor'),
        eq(notes.kind, 'reply'),
        isNull(notes.sentAt),
      ),
    );
}

async function mailBoth(
  tx: Database,
  deps: Deps,
  { actor, row }: Submission,
  { result, receivedOn, dueOn }: { result: CheckResult; receivedOn: string; dueOn: string },
): Promise<void> {
  const { revision, submittal, project, contractor, agency } = row;
  const words = {
    project,
    mixDesignation: submittal.mixDesignation,
    revision: revision.number,
    contractor: contractor.name,
    agency: agency.name,
    submittedOn: receivedOn,
    dueOn,
    summary: result.summary,
    seal: result.seal.seal,
    address: `${deps.settings.publicUrl}/submittals/${submittal.id}/r/${revision.number}`,
  };
  const about = { subject: { kind: 'revision', id: revision.id }, submittalId: submittal.id };
  await enqueueMail(tx, deps, {
    ...about,
    organisationId: agency.id,
    kind: 'receipt',
    recipients: [{ name: actor.person.name, email: actor.person.email }],
    content: receiptMail(words),
  });
  const reviewers = await peopleWithRole(tx, agency.id, 'reviewer');
  if (reviewers.length === 0) return;
  await enqueueMail(tx, deps, {
    subject: about.subject,
    organisationId: agency.id,
    kind: 'review wanted',
    recipients: reviewers.map(({ name, email }) => ({ name, email })),
    content: reviewWantedMail(words),
  });
}

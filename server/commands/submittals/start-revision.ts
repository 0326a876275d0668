import { eq } from 'drizzle-orm';
import type { Database } from '../../db/client';
import { lockSubmittal } from '../../db/queries/revisions';
import { snapshotOfSection } from '../../db/queries/section-snapshot';
import { projects } from '../../db/schema/projects';
import { revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { type Actor, preparesSubmittals } from '../../policies/actor';
import { mayFollow } from '../../policies/revision-abilities';
import { Problem } from '../../problem';
import type { UploadedFile } from '../../uploaded-file';
import { enqueueReading, storeFile, workbookMediaType } from './store-workbook';
import { expectLaboratory } from './upload-submittal';

interface NextRevision {
  actor: Actor;
  requestId: string;
  submittalId: string;
  laboratoryId: string;
  reason: string;
  workbook: UploadedFile;
}

/** The next draft after a return. The submittal is locked, so that two uploads never make two drafts. */
export async function startRevision(deps: Deps, next: NextRevision): Promise<number> {
  const { actor, submittalId, laboratoryId, reason, workbook } = next;
  const number = await deps.db.transaction(async (tx) => {
    const submittal = await lockSubmittal(tx, actor, submittalId);
    if (submittal === null || actor.kind !== 'contractor') throw new Problem('not-found');
    if (!preparesSubmittals(actor)) throw new Problem('not-allowed');
    const latest = await latestOf(tx, submittalId);
    if (!mayFollow({ ...latest, latest: true })) throw refusal(submittal.mixDesignation, latest);
    if (submittal.standingRevision !== null && reason === '') {
      const detail = `Revision ${submittal.standingRevision} is approved. Say why another one follows.`;
      throw new Problem('invalid-input', { detail, errors: [{ pointer: '/reason', detail }] });
    }
    await expectLaboratory(tx, actor, laboratoryId);
    const now = deps.now();
    const tenant = { agencyId: submittal.agencyId, contractorId: submittal.contractorId };
    const fileId = await storeFile(tx, deps, {
      tenant,
      kind: 'workbook',
      file: workbook,
      mediaType: workbookMediaType(workbook.fileName),
      createdById: actor.personId,
    });
    const revisionId = deps.newId();
    await tx.insert(revisions).values({
      id: revisionId,
      ...tenant,
      submittalId,
      number: latest.number + 1,
      state: 'draft',
      reasonForRevision: reason === '' ? null : reason,
      laboratoryId,
      section: await sectionNow(tx, actor, submittal),
      workbookFileId: fileId,
      uploadedById: actor.personId,
      uploadedAt: now,
      createdAt: now,
      updatedAt: now,
    });
    await tx
      .update(submittals)
      .set({ latestNumber: latest.number + 1, updatedAt: now })
      .where(eq(submittals.id, submittalId));
    await enqueueReading(tx, deps, { actor, revisionId, fileId, fileName: workbook.fileName });
    await writeAudit(tx, deps, {
      actor,
      act: 'revision started',
      subject: { kind: 'revision', id: revisionId },
      detail: { mixDesignation: submittal.mixDesignation, number: latest.number + 1 },
      requestId: next.requestId,
    });
    return latest.number + 1;
  });
  deps.wake.jobs();
  return number;
}

type Latest = Pick<typeof revisions.$inferSelect, 'number' | 'state' | 'disposition'>;

async function latestOf(tx: Database, submittalId: string): Promise<Latest> {
  const rows = await tx
    .select({ number: revisions.number, state: revisions.state, disposition: revisions.disposition })
    .from(revisions)
    .where(eq(revisions.submittalId, submittalId))
    .orderBy(revisions.number)
    .for('update');
  const latest = rows.at(-1);
  if (latest === undefined) throw new Error(`Submittal ${submittalId} has no revision.`);
  return latest;
}

function refusal(mixDesignation: string, { number, state, disposition }: Latest): Problem {
  const named = `${mixDesignation} revision ${number}`;
  if (state === 'draft') {
    return new Problem('wrong-state', {
      detail: `${named} is open as a draft; there is one draft at a time.`,
      fix: 'Replace the workbook of that draft.',
    });
  }
  if (disposition === 'rejected') {
    return new Problem('wrong-state', {
      detail: `${named} was rejected, and a rejected mix is not revised.`,
      fix: 'Upload the workbook as a new submittal; the designation is free again.',
    });
  }
  if (state === 'withdrawn') {
    return new Problem('wrong-state', {
      detail: `${mixDesignation} was withdrawn before it was answered.`,
      fix: 'Upload the workbook as a new submittal; the designation is free again.',
    });
  }
  return new Problem('wrong-state', {
    detail: `${named} is with the agency.`,
    fix: 'Wait for its return, or withdraw it first.',
  });
}

async function sectionNow(
  tx: Database,
  actor: Actor,
  { projectId, sectionId }: { projectId: string; sectionId: string },
) {
  const section = await snapshotOfSection(tx, actor, { projectId, sectionId });
  if (section !== null) return section;
  const [project] = await tx
    .select({ number: projects.number })
    .from(projects)
    .where(eq(projects.id, projectId));
  throw new Problem('wrong-state', {
    detail: `The section of ${project?.number ?? 'the project'} is not confirmed.`,
    fix: 'Ask the agency to confirm it.',
  });
}

import { and, eq } from 'drizzle-orm';
import type { Database } from '../../db/client';
import { isDuplicateEntry } from '../../db/duplicate-entry';
import { snapshotOfSection } from '../../db/queries/section-snapshot';
import { laboratories } from '../../db/schema/people';
import { projectContractors, projects } from '../../db/schema/projects';
import { revisions, submittals } from '../../db/schema/submittals';
import { writeAudit } from '../../db/write-audit';
import type { Deps } from '../../deps';
import { type Actor, preparesSubmittals } from '../../policies/actor';
import { Problem } from '../../problem';
import type { UploadedFile } from '../../uploaded-file';
import { enqueueReading, storeFile, workbookMediaType } from './store-workbook';

export interface Upload {
  actor: Actor;
  requestId: string;
  projectId: string;
  sectionId: string;
  laboratoryId: string;
  mixDesignation: string;
  workbook: UploadedFile;
}

/** Revision 0 of a new submittal: bytes, draft and the work of reading it, in one transaction. */
export async function uploadSubmittal(
  deps: Deps,
  upload: Upload,
): Promise<{ submittalId: string; number: number }> {
  const { actor, projectId, sectionId, laboratoryId, mixDesignation, workbook } = upload;
  if (!preparesSubmittals(actor)) throw new Problem('not-allowed');
  const submittalId = deps.newId();
  const revisionId = deps.newId();
  await deps.db.transaction(async (tx) => {
    const project = await expectProject(tx, actor, projectId);
    const section = await snapshotOfSection(tx, actor, { projectId, sectionId });
    if (section === null) throw unusable('/sectionId', 'This project has no confirmed section of that kind.');
    await expectLaboratory(tx, actor, laboratoryId);
    const now = deps.now();
    const tenant = { agencyId: project.agencyId, contractorId: actor.organisationId };
    const fileId = await storeFile(tx, deps, {
      tenant,
      kind: 'workbook',
      file: workbook,
      mediaType: workbookMediaType(workbook.fileName),
      createdById: actor.personId,
    });
    const common = { ...tenant, createdAt: now, updatedAt: now };
    await insertSubmittal(
      tx,
      {
        ...common,
        id: submittalId,
        projectId,
        sectionId,
        mixDesignation,
        activeDesignation: mixDesignation,
        latestNumber: 0,
        createdById: actor.personId,
      },
      project.number,
    );
    await tx.insert(revisions).values({
      ...common,
      id: revisionId,
      submittalId,
      number: 0,
      state: 'draft',
      laboratoryId,
      section,
      workbookFileId: fileId,
      uploadedById: actor.personId,
      uploadedAt: now,
    });
    await enqueueReading(tx, deps, { actor, revisionId, fileId, fileName: workbook.fileName });
    await writeAudit(tx, deps, {
      actor,
      act: 'submittal uploaded',
      subject: { kind: 'revision', id: revisionId },
      detail: { mixDesignation, project: project.number, number: 0 },
      requestId: upload.requestId,
    });
  });
  deps.wake.jobs();
  return { submittalId, number: 0 };
}

async function insertSubmittal(
  tx: Database,
  values: typeof submittals.$inferInsert,
  projectNumber: string,
): Promise<void> {
  try {
    await tx.insert(submittals).values(values);
  } catch (error) {
    if (!isDuplicateEntry(error)) throw error;
    throw new Problem('already-exists', {
      detail: `${values.mixDesignation} is a submittal for ${projectNumber} already.`,
      fix: 'Open it to replace its workbook or to start its next revision, or choose another designation.',
    });
  }
}

async function expectProject(tx: Database, actor: Actor, projectId: string) {
  const [project] = await tx
    .select({ agencyId: projects.agencyId, number: projects.number })
    .from(projects)
    .innerJoin(projectContractors, eq(projectContractors.projectId, projects.id))
    .where(and(eq(projects.id, projectId), eq(projectContractors.contractorId, actor.organisationId)));
  if (project === undefined) throw unusable('/projectId', 'This is not one of your projects.');
  return project;
}

export async function expectLaboratory(tx: Database, actor: Actor, laboratoryId: string): Promise<void> {
  const [laboratory] = await tx
    .select({ id: laboratories.id })
    .from(laboratories)
    .where(and(eq(laboratories.id, laboratoryId), eq(laboratories.organisationId, actor.organisationId)));
  if (laboratory === undefined) throw unusable('/laboratoryId', 'This is not one of your laboratories.');
}

function unusable(pointer: string, detail: string): Problem {
  return new Problem('invalid-input', { detail, errors: [{ pointer, detail }] });
}

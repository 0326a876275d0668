import { and, asc, eq, max, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';
import type { Database } from '../client';
import { checks } from '../schema/checks';
import { files } from '../schema/files';
import { laboratories, organisations, people } from '../schema/people';
import { projects, sections } from '../schema/projects';
import { returns } from '../schema/returns';
import { mixRecords, revisions, submittals } from '../schema/submittals';
import { type Reader, returnsOf, revisionsOf, submittalsOf } from './reader';

const contractor = alias(organisations, 'contractor');
const agency = alias(organisations, 'agency');
const uploader = alias(people, 'uploader');
const submitter = alias(people, 'submitter');
const reviewer = alias(people, 'reviewer');
const confirmer = alias(people, 'confirmer');

export type RevisionRow = NonNullable<Awaited<ReturnType<typeof findRevision>>>;

/** A revision with all that its page names, or null where the reader's organisation may not know of it. */
export async function findRevision(
  db: Database,
  reader: Reader,
  { submittalId, number }: { submittalId: string; number: number },
) {
  const [row] = await db
    .select({
      revision: revisions,
      submittal: submittals,
      project: {
        id: projects.id,
        number: projects.number,
        title: projects.title,
        lettingOn: projects.lettingOn,
        facts: projects.facts,
      },
      contractor: { id: contractor.id, name: contractor.name },
      agency: {
        id: agency.id,
        name: agency.name,
        timeZone: agency.timeZone,
        reviewWorkingDays: agency.reviewWorkingDays,
        waiverPolicy: agency.waiverPolicy,
      },
      laboratory: { id: laboratories.id, name: laboratories.name },
      section: {
        id: sections.id,
        resolvedHash: sections.resolvedHash,
        confirmedAt: sections.confirmedAt,
        confirmedBy: confirmer.name,
        version: sections.version,
      },
      workbook: {
        id: files.id,
        fileName: files.fileName,
        mediaType: files.mediaType,
        sha256: files.sha256,
        sizeBytes: files.sizeBytes,
      },
      uploadedBy: uploader.name,
      submittedBy: submitter.name,
      reviewer: reviewer.name,
      mappingName: mixRecords.mappingName,
    })
    .from(revisions)
    .innerJoin(submittals, eq(submittals.id, revisions.submittalId))
    .innerJoin(projects, eq(projects.id, submittals.projectId))
    .innerJoin(contractor, eq(contractor.id, submittals.contractorId))
    .innerJoin(agency, eq(agency.id, submittals.agencyId))
    .innerJoin(laboratories, eq(laboratories.id, revisions.laboratoryId))
    .innerJoin(sections, eq(sections.id, submittals.sectionId))
    .innerJoin(files, eq(files.id, revisions.workbookFileId))
    .innerJoin(uploader, eq(uploader.id, revisions.uploadedById))
    .leftJoin(submitter, eq(submitter.id, revisions.submittedById))
    .leftJoin(reviewer, eq(reviewer.id, revisions.takenById))
    .leftJoin(confirmer, eq(confirmer.id, sections.confirmedById))
    .leftJoin(mixRecords, eq(mixRecords.revisionId, revisions.id))
    .where(and(eq(revisions.submittalId, submittalId), eq(revisions.number, number), revisionsOf(reader)));
  return row ?? null;
}

/** The newest revision that the reader may see, or null. */
export async function latestVisibleNumber(
  db: Database,
  reader: Reader,
  submittalId: string,
): Promise<number | null> {
  const [row] = await db
    .select({ number: max(revisions.number) })
    .from(revisions)
    .where(and(eq(revisions.submittalId, submittalId), revisionsOf(reader)));
  return row?.number ?? null;
}

/** Every revision of a submittal that the reader may see, with the summary of its newest check. */
export function listRevisions(db: Database, reader: Reader, submittalId: string) {
  return db
    .select({ revision: revisionColumns, summary: checks.summary })
    .from(revisions)
    .leftJoin(checks, and(eq(checks.revisionId, revisions.id), eq(checks.number, newestCheck)))
    .where(and(eq(revisions.submittalId, submittalId), revisionsOf(reader)))
    .orderBy(asc(revisions.number));
}

/** Locks a revision for a command that changes it. */
export async function lockRevision(db: Database, reader: Reader, revisionId: string) {
  const [row] = await db
    .select()
    .from(revisions)
    .where(and(eq(revisions.id, revisionId), revisionsOf(reader)))
    .for('update');
  return row ?? null;
}

/** Locks a submittal, so that only one revision of it is started at a time. */
export async function lockSubmittal(db: Database, reader: Reader, submittalId: string) {
  const [row] = await db
    .select()
    .from(submittals)
    .where(and(eq(submittals.id, submittalId), submittalsOf(reader)))
    .for('update');
  return row ?? null;
}

/** Who signed the return of a revision; null before it is sent. */
export async function nameOfDecider(
  db: Database,
  reader: Reader,
  revisionId: string,
): Promise<string | null> {
  const [row] = await db
    .select({ name: people.name })
    .from(returns)
    .innerJoin(people, eq(people.id, returns.decidedById))
    .where(and(eq(returns.revisionId, revisionId), eq(returns.state, 'sent'), returnsOf(reader)));
  return row?.name ?? null;
}

/** What lists show of a revision. */
export const revisionColumns = {
  id: revisions.id,
  submittalId: revisions.submittalId,
  number: revisions.number,
  state: revisions.state,
  disposition: revisions.disposition,
  description: revisions.description,
  doubtCount: revisions.doubtCount,
  submittedAt: revisions.submittedAt,
  returnedAt: revisions.returnedAt,
  withdrawnAt: revisions.withdrawnAt,
  receivedOn: revisions.receivedOn,
  dueOn: revisions.dueOn,
  workingDaysTaken: revisions.workingDaysTaken,
  takenById: revisions.takenById,
  changes: revisions.changes,
  updatedAt: revisions.updatedAt,
  version: revisions.version,
};

/** The number of the check that is shown of a revision. */
export const newestCheck = sql<number>`(select max(c.number) from checks c where c.revision_id = ${revisions.id})`;

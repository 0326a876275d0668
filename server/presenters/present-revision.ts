import type { Summary } from '#rules/engine/finding';
import type { Revision } from '#shared/contracts/submittals';
import { dateOfInstant } from '#shared/format/dates';
import { workingDaysBetween } from '#shared/working-days';
import type { JobRow } from '../db/queries/jobs';
import type { listReplacedWorkbooks } from '../db/queries/records';
import type { RevisionRow } from '../db/queries/revisions';
import type { revisions } from '../db/schema/submittals';
import type { Actor } from '../policies/actor';
import { type RevisionFacts, revisionAbilities } from '../policies/revision-abilities';
import { isActive, presentJob } from './present-job';
import { presentRevisionItem } from './present-revision-item';
import { standingApproval } from './present-submittal-item';
import { templateHrefOf } from './template-href';

export interface RevisionParts {
  row: RevisionRow;
  actor: Actor;
  now: Date;
  job: JobRow | null;
  hasCheck: boolean;
  /** Every revision that the reader may see. */
  all: { revision: Parameters<typeof presentRevisionItem>[0]; summary: Summary | null }[];
  /** Of a contractor's own revision. */
  replaced: Awaited<ReturnType<typeof listReplacedWorkbooks>>;
  /** Who decided, where the revision is returned. */
  decidedBy: string | null;
}

export function presentRevision(parts: RevisionParts): Revision {
  const { row, all, job } = parts;
  const { revision, submittal, project, workbook } = row;
  return {
    submittalId: submittal.id,
    mixDesignation: submittal.mixDesignation,
    number: revision.number,
    state: revision.state,
    disposition: revision.disposition,
    version: revision.version,
    project: { id: project.id, number: project.number, title: project.title, lettingOn: project.lettingOn },
    contractor: row.contractor,
    agency: { id: row.agency.id, name: row.agency.name, timeZone: row.agency.timeZone },
    section: presentSection(row),
    laboratory: row.laboratory,
    description: revision.description,
    revisions: all.map((each) => presentRevisionItem(each.revision, each.summary)),
    standingApproval: standingApproval(submittal),
    reasonForRevision: revision.reasonForRevision,
    workbook: {
      fileName: workbook.fileName,
      sha256: workbook.sha256,
      bytes: workbook.sizeBytes,
      uploadedBy: row.uploadedBy,
      uploadedAt: revision.uploadedAt.toISOString(),
    },
    replacedWorkbooks: parts.replaced.map(({ fileId: _, replacedAt, ...replaced }) => ({
      ...replaced,
      replacedAt: replacedAt.toISOString(),
    })),
    mappingName: row.mappingName,
    reviewer: reviewerOf(row),
    receivedOn: revision.receivedOn,
    dueOn: revision.dueOn,
    workingDaysLeft: workingDaysLeft(row, parts.now),
    declaration: declarationOf(row),
    job: job === null ? null : presentJob(job),
    doubts: revision.doubtCount,
    hasCheck: parts.hasCheck,
    returned: returnedOf(revision, parts.decidedBy),
    abilities: revisionAbilities(parts.actor, revisionFacts(parts)),
  };
}

export function revisionFacts({
  row,
  job,
  hasCheck,
}: Pick<RevisionParts, 'row' | 'job' | 'hasCheck'>): RevisionFacts {
  const { revision, submittal, agency } = row;
  return {
    state: revision.state,
    number: revision.number,
    disposition: revision.disposition,
    reviewerId: revision.takenById,
    latest: revision.number === submittal.latestNumber,
    hasCheck,
    reading: isActive(job),
    standingApproval: submittal.standingRevision !== null,
    waiverPolicy: agency.waiverPolicy,
  };
}

function presentSection({ revision, section, submittal }: RevisionRow): Revision['section'] {
  const { base, layers, resolvedHash } = revision.section;
  return {
    id: section.id,
    base,
    layers,
    confirmed: section.confirmedAt !== null,
    confirmedBy: section.confirmedBy,
    resolvedHash,
    version: section.version,
    templateHref: templateHrefOf(submittal),
  };
}

function reviewerOf({ revision, reviewer }: RevisionRow): Revision['reviewer'] {
  return revision.takenById === null || reviewer === null ? null : { id: revision.takenById, name: reviewer };
}

/** The clock runs while the revision is with the agency. */
function workingDaysLeft({ revision, agency }: RevisionRow, now: Date): number | null {
  if (revision.state !== 'submitted' && revision.state !== 'in review') return null;
  if (revision.dueOn === null) return null;
  return workingDaysBetween(dateOfInstant(now.toISOString(), agency.timeZone), revision.dueOn);
}

function declarationOf({ revision, submittedBy }: RevisionRow): Revision['declaration'] {
  const { declaration, submittedAt } = revision;
  if (declaration === null || submittedAt === null || submittedBy === null) return null;
  return { text: declaration, by: submittedBy, at: submittedAt.toISOString() };
}

type RevisionColumns = typeof revisions.$inferSelect;

function returnedOf(
  { returnedAt, disposition }: RevisionColumns,
  decidedBy: string | null,
): Revision['returned'] {
  if (returnedAt === null || disposition === null) return null;
  return { at: returnedAt.toISOString(), disposition, by: decidedBy ?? '' };
}

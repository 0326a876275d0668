import type { OrganisationKind } from '#shared/contracts/roles';
import type { SubmittalListItem } from '#shared/contracts/submittals';
import type { JobRow } from '../db/queries/jobs';
import type { SubmittalRow } from '../db/queries/list-submittals';
import { nextWords } from './next-words';
import { presentRevisionItem } from './present-revision-item';

export function presentSubmittalItem(
  row: SubmittalRow,
  { kind, job }: { kind: OrganisationKind; job: JobRow | null },
): SubmittalListItem {
  const { revision, summary } = row;
  return {
    id: row.id,
    mixDesignation: row.mixDesignation,
    description: revision.description,
    project: row.project,
    contractor: row.contractor,
    agency: row.agency,
    revision: presentRevisionItem(revision, summary),
    standingApproval: standingApproval(row),
    doubts: revision.doubtCount,
    updatedAt: (row.changedAt ?? revision.updatedAt).toISOString(),
    next: nextWords(kind, { ...revision, doubts: revision.doubtCount, summary, job }),
  };
}

interface Standing {
  standingRevision: number | null;
  standingDisposition: NonNullable<SubmittalListItem['standingApproval']>['disposition'] | null;
  standingOn: string | null;
}

export function standingApproval({ standingRevision, standingDisposition, standingOn }: Standing) {
  if (standingRevision === null || standingDisposition === null || standingOn === null) return null;
  return { revision: standingRevision, disposition: standingDisposition, on: standingOn };
}

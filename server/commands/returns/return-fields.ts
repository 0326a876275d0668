import { recommendDisposition } from '#rules/engine/disposition';
import type { Disposition } from '#rules/engine/finding';
import type { ReturnFields } from '#shared/contracts/returns';
import type { Database } from '../../db/client';
import { contactsOfProject } from '../../db/queries/projects';
import type { Reader } from '../../db/queries/reader';
import { type ReturnRow, submitterOf } from '../../db/queries/returns';
import type { RevisionRow } from '../../db/queries/revisions';
import type { LoadedRevision } from '../../documents/load-revision-documents';
import { includedAtFirst } from '../../presenters/return-items';
import { Problem } from '../../problem';

export function recommended({ sources, waived }: LoadedRevision): Disposition {
  return recommendDisposition([...sources.findings], waived);
}

/** A draft that nobody has kept yet: the recommendation, to whoever submitted, with all that may go with it. */
export async function firstReturnFields(
  db: Database,
  reader: Reader,
  { row, loaded }: { row: RevisionRow; loaded: LoadedRevision },
): Promise<ReturnFields> {
  const [submitter, contacts] = await Promise.all([
    submitterOf(db, reader, row.revision.id),
    contactsOfProject(db, reader, row.project.id),
  ]);
  return {
    disposition: recommended(loaded),
    reason: '',
    textAbove: '',
    textBelow: '',
    to:
      submitter === null
        ? []
        : [{ name: submitter.name, email: submitter.email, function: 'quality manager' }],
    copies: contacts,
    included: includedAtFirst(loaded.sources),
    findingsWorkbook: true,
  };
}

export function keptReturnFields(kept: ReturnRow): ReturnFields {
  return {
    disposition: kept.disposition,
    reason: kept.reason,
    textAbove: kept.textAbove,
    textBelow: kept.textBelow,
    to: kept.recipients,
    copies: kept.copies,
    included: kept.included,
    findingsWorkbook: kept.findingsWorkbook,
  };
}

/** What has to hold before a return may be signed; all faults at once. */
export function refuseUnfinished(fields: ReturnFields, recommendation: Disposition): void {
  const errors = [];
  if (fields.disposition !== recommendation && fields.reason.trim() === '') {
    errors.push({
      pointer: '/reason',
      detail: `The recommendation is ${recommendation}.`,
      fix: 'Give the reason for deciding otherwise.',
    });
  }
  if (fields.to.length === 0) {
    errors.push({ pointer: '/to', detail: 'Nobody would receive it.', fix: 'Name at least one recipient.' });
  }
  if (errors.length > 0)
    throw new Problem('invalid-input', { detail: 'The return is not complete.', errors });
}

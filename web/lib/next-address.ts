import type { RevisionListItem } from '#shared/contracts/submittals';
import { paths } from './paths';

/** Where a mix is opened: its findings once it has been checked, else how its workbook was read. */
export function addressOfRevision(
  submittalId: string,
  revision: Pick<RevisionListItem, 'number' | 'state' | 'summary'>,
): string {
  return revision.state === 'draft' && revision.summary === null
    ? paths.reading(submittalId, revision.number)
    : paths.revision(submittalId, revision.number);
}

import type { RevisionRow } from '../../db/queries/revisions';
import type { Settings } from '../../env';

/** Where the contractor reads the return and answers it. */
export function returnAddress(
  { publicUrl }: Pick<Settings, 'publicUrl'>,
  { submittal, revision }: RevisionRow,
): string {
  return `${publicUrl}/submittals/${submittal.id}/r/${revision.number}/return`;
}

import { Link } from 'react-router-dom';
import type { Revision } from '#shared/contracts/submittals';
import { paths } from '../../../lib/paths';

/** Uploading again to a draft replaces its workbook and keeps its number. */
export function ReplaceWorkbook({ revision }: { revision: Pick<Revision, 'submittalId' | 'number'> }) {
  return (
    <p className="small mute pt-3">
      A corrected workbook takes the place of this one and keeps the number of the revision.{' '}
      <Link to={paths.workbook(revision.submittalId, revision.number)}>Upload it again</Link>
    </p>
  );
}

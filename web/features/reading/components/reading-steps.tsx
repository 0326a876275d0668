import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths';
import type { RevisionParams } from '../../../lib/queries/revision-query';

/** Where the reader stands between uploading and submitting. */
export function ReadingSteps({ params, hasCheck }: { params: RevisionParams; hasCheck: boolean }) {
  return (
    <ol className="steps" aria-label="Steps">
      <li>Uploaded</li>
      <li aria-current="step">Confirm the reading</li>
      <li>
        {hasCheck ? (
          <Link className="plain" to={paths.revision(params.submittalId, params.number)}>
            Findings
          </Link>
        ) : (
          'Findings'
        )}
      </li>
      <li>Submit</li>
    </ol>
  );
}

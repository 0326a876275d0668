import { Link } from 'react-router-dom';
import { formatDate, formatInstant } from '#shared/format/dates';
import { sectionWords } from '#shared/format/section-words';
import { shortHash } from '#shared/format/short-hash';
import { EmptyState } from '../../../components/ui/empty-state';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { paths } from '../../../lib/paths';
import { useRevision } from '../../../lib/queries/revision-query';
import { useRevisionParams } from '../../../lib/revision-params';
import { usePageTitle } from '../../../lib/use-page-title';
import { useChecks } from '../api/kept-checks';

/** A check of record is kept for ever: each can be looked at as it was made. */
export function ChecksPage() {
  const params = useRevisionParams();
  const revision = useRevision(params);
  const checks = useChecks(params);
  const { timeZone } = revision.agency;
  usePageTitle(`Checks of ${revision.mixDesignation} revision ${revision.number}`);
  return (
    <MarginPage>
      <PageHead
        kicker={
          <Link to={paths.revision(params.submittalId, params.number)}>
            {revision.mixDesignation} revision {revision.number}
          </Link>
        }
        title="Checks of this revision"
        rest="newest first; the newest is the one on its page"
      />
      {checks.length === 0 ? (
        <EmptyState title="It has not been checked yet.">
          It is checked once its workbook has been read.
        </EmptyState>
      ) : (
        <table className="table table-stacked">
          <caption className="hidden-text">Checks</caption>
          <thead>
            <tr>
              <th scope="col">Made</th>
              <th scope="col">Judged as submitted on</th>
              <th scope="col">Edition</th>
              <th scope="col">Engine</th>
              <th scope="col">Seal</th>
              <th scope="col">Recommended</th>
            </tr>
          </thead>
          <tbody>
            {checks.map((check) => (
              <tr key={check.number}>
                <th scope="row">
                  <Link to={paths.keptCheck(params.submittalId, params.number, check.number)}>
                    {formatInstant(check.madeAt, timeZone)}
                  </Link>{' '}
                  <span className="mute font-normal">
                    {check.kind}
                    {check.madeBy === null ? '' : `, by ${check.madeBy}`}
                  </span>
                </th>
                <td>{formatDate(check.submittedOn)}</td>
                <td>{sectionWords(check)}</td>
                <td>{check.engineVersion}</td>
                <td title={check.seal}>{shortHash(check.seal)}</td>
                <td>{check.recommended}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </MarginPage>
  );
}

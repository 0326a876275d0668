import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import type { Revision } from '#shared/contracts/submittals';
import { EmptyState } from '../../../components/ui/empty-state';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { PlainPage } from '../../../components/ui/margin-page';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useRenewWhileRunning } from '../hooks/use-renew-while-running';
import { RevisionHead } from './revision-head';

/** While the workbook is being read, and where it could not be. */
export function NotYetChecked({ revision }: { revision: Revision }) {
  const { submittalId, number, job } = revision;
  const running = job !== null && (job.state === 'waiting' || job.state === 'running');
  useRenewWhileRunning({ submittalId, number }, running);
  const reading = paths.reading(submittalId, number);
  return (
    <PlainPage>
      <RevisionHead revision={revision} />
      {running ? (
        <LoadingBars
          what={job.progress || 'Waiting to be read.'}
          rows={8}
          whenLong="Large workbooks take longest at their biggest sheet. The page follows by itself."
        />
      ) : (
        <EmptyState title={job?.problem ? job.problem.detail : 'This revision has no findings yet.'}>
          {job?.problem?.fix} They stand here once the workbook has been read and checked.{' '}
          <Link to={reading}>See how it was read</Link>
        </EmptyState>
      )}
      <RunningFoot texts={[cautions.findings]} />
    </PlainPage>
  );
}

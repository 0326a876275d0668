import { useEffect } from 'react';
import type { Revision } from '#shared/contracts/submittals';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { LoadingBars } from '../../../components/ui/loading-bars';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { asProblem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useCancelJob } from '../api/cancel-job';
import { useWatchedRevision } from '../api/watch-revision';
import { problemOfJob } from '../lib/problem-of-job';

/** What the server is doing with the workbook, until it has been read, has failed or was cancelled. */
export function ReadingProgress({
  params,
  onRead,
  templateHref,
}: {
  params: RevisionParams;
  onRead: (revision: Revision) => void;
  templateHref: string | null;
}) {
  const { data: revision, error } = useWatchedRevision(params, true);
  const cancel = useCancelJob(params);
  const job = revision?.job ?? null;
  const isRead = revision !== undefined && (job === null || job.state === 'done');
  // biome-ignore lint/correctness/useExhaustiveDependencies: going on happens once, when the reading is done.
  useEffect(() => {
    if (isRead) onRead(revision);
  }, [isRead]);
  if (error)
    return <ProblemNotice problem={asProblem(error)} unaffected="The workbook is kept as uploaded." />;
  if (!job || isRead) return <LoadingBars what="Opening the reading." />;
  if (job.state === 'failed') {
    return (
      <ProblemNotice
        problem={problemOfJob(job)}
        unaffected="What you entered is kept; choose the corrected workbook below."
      >
        <TemplateLink href={job.problem?.href ?? templateHref} />
      </ProblemNotice>
    );
  }
  if (job.state === 'cancelled') {
    return (
      <EmptyState title="Reading was cancelled.">
        The draft is kept. Choose the workbook again to have it read.
      </EmptyState>
    );
  }
  return (
    <div>
      <LoadingBars
        what={job.progress || 'Waiting to be read.'}
        whenLong="Large workbooks take longer: every cell is read, hidden sheets too. You may leave this page; reading goes on."
      />
      <Button onPress={() => cancel.mutate(job)} isPending={cancel.isPending}>
        Cancel reading
      </Button>
      {cancel.error ? <ProblemNotice problem={asProblem(cancel.error)} /> : null}
    </div>
  );
}

function TemplateLink({ href }: { href: string | null }) {
  if (!href) return null;
  return (
    <p>
      <a href={href} download>
        Template of the section
      </a>
    </p>
  );
}

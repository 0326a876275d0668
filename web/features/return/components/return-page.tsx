import { usePrintedRevision } from '../../../lib/print-frame';
import { type RevisionParams, useRevision } from '../../../lib/queries/revision-query';
import { usePageTitle } from '../../../lib/use-page-title';
import { useReturn } from '../api/get-return';
import { DecidePage } from './decide-page';
import { SentPage } from './sent-page';
import '../return.css';

/** Before sending: the decision beside the letter as it will be. After: what was sent, and what was answered. */
export function ReturnPage({ params }: { params: RevisionParams }) {
  const view = useReturn(params);
  const revision = useRevision(params);
  usePageTitle(`Return of ${revision.mixDesignation} revision ${revision.number}`);
  usePrintedRevision(revision);
  return view.state === 'sent' ? (
    <SentPage params={params} view={view} revision={revision} />
  ) : (
    <DecidePage params={params} view={view} revision={revision} />
  );
}

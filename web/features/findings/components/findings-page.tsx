import { usePrintedRevision } from '../../../lib/print-frame';
import { useRevision } from '../../../lib/queries/revision-query';
import { useRevisionParams } from '../../../lib/revision-params';
import { usePageTitle } from '../../../lib/use-page-title';
import { FindingsOfCheck } from './findings-of-check';
import { NotYetChecked } from './not-yet-checked';

export function FindingsPage() {
  const params = useRevisionParams();
  const revision = useRevision(params);
  usePageTitle(`Findings, ${revision.mixDesignation} revision ${revision.number}`);
  usePrintedRevision(revision);
  return revision.hasCheck ? (
    <FindingsOfCheck key={`${params.submittalId} ${params.number}`} params={params} revision={revision} />
  ) : (
    <NotYetChecked revision={revision} />
  );
}

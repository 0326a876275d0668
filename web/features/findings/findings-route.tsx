import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { checkQuery } from '../../lib/queries/check-query';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams } from '../../lib/revision-params';

export { FindingsPage as Component } from './components/findings-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const at = readRevisionParams(params);
  const revision = await queryClient.ensureQueryData(revisionQuery(at));
  if (revision.hasCheck) await queryClient.ensureQueryData(checkQuery(at));
  return null;
}

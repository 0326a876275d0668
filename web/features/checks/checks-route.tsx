import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams } from '../../lib/revision-params';
import { checksQuery } from './api/kept-checks';

export { ChecksPage as Component } from './components/checks-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const at = readRevisionParams(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(at)),
    queryClient.ensureQueryData(checksQuery(at)),
  ]);
  return null;
}

import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { checkQuery } from '../../lib/queries/check-query';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams } from '../../lib/revision-params';

export { GradationPage as Component } from './components/gradation-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const at = readRevisionParams(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(at)),
    queryClient.ensureQueryData(checkQuery(at)),
  ]);
  return null;
}

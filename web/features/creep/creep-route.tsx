import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams } from '../../lib/revision-params';
import { creepQuery } from './api/get-creep';

export { CreepPage as Component } from './components/creep-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const at = readRevisionParams(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(at)),
    queryClient.ensureQueryData(creepQuery(at)),
  ]);
  return null;
}

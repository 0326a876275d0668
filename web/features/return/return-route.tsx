import type { LoaderFunctionArgs } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams, useRevisionParams } from '../../lib/revision-params';
import { returnQuery } from './api/get-return';
import { ReturnPage } from './components/return-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const revision = readRevisionParams(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(revision)),
    queryClient.ensureQueryData(returnQuery(revision)),
  ]);
  return null;
}

export function Component() {
  const params = useRevisionParams();
  return <ReturnPage key={`${params.submittalId} ${params.number}`} params={params} />;
}

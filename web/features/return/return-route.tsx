import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { returnQuery } from './api/get-return';
import { ReturnPage } from './components/return-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const revision = revisionOf(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(revision)),
    queryClient.ensureQueryData(returnQuery(revision)),
  ]);
  return null;
}

export function Component() {
  const params = revisionOf(useParams());
  return <ReturnPage key={`${params.submittalId} ${params.number}`} params={params} />;
}

function revisionOf(params: { submittalId?: string | undefined; number?: string | undefined }) {
  return { submittalId: params.submittalId ?? '', number: Number(params.number) };
}

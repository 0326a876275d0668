import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { revisionQuery } from '../../lib/queries/revision-query';
import { readRevisionParams } from '../../lib/revision-params';
import { keptCheckQuery } from './api/kept-checks';
import { KeptCheckPage } from './components/kept-check-page';

export async function loader({ params }: LoaderFunctionArgs) {
  const at = readRevisionParams(params);
  await Promise.all([
    queryClient.ensureQueryData(revisionQuery(at)),
    queryClient.ensureQueryData(keptCheckQuery(at, Number(params.check))),
  ]);
  return null;
}

export function Component() {
  return <KeptCheckPage number={Number(useParams().check)} />;
}

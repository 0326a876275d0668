import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { laboratoriesQuery } from '../../lib/queries/laboratories-query';
import { submittalQuery } from './api/get-submittal';
import { NextRevisionPage } from './components/next-revision-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await Promise.all([
    queryClient.ensureQueryData(submittalQuery(params.submittalId ?? '')),
    queryClient.ensureQueryData(laboratoriesQuery()),
  ]);
  return null;
}

export function Component() {
  const { submittalId = '' } = useParams();
  return <NextRevisionPage submittalId={submittalId} />;
}

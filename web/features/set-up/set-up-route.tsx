import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { setUpQuery } from './api/set-up';
import { SetUpPage } from './components/set-up-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(setUpQuery(params.token ?? ''));
  return null;
}

export function Component() {
  const { token = '' } = useParams();
  return <SetUpPage token={token} />;
}

import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { contractorsQuery } from '../../lib/queries/contractors-query';
import { projectQuery } from '../../lib/queries/projects-query';
import { ChangeProjectPage } from './components/change-project-pages';

export async function loader({ params }: LoaderFunctionArgs) {
  await Promise.all([
    queryClient.ensureQueryData(projectQuery(params.projectId ?? '')),
    queryClient.ensureQueryData(contractorsQuery()),
  ]);
  return null;
}

export function Component() {
  const { projectId = '' } = useParams();
  return <ChangeProjectPage projectId={projectId} />;
}

import { type LoaderFunctionArgs, useParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { projectQuery } from '../../lib/queries/projects-query';
import { ProjectPage } from './components/project-page';

export async function loader({ params }: LoaderFunctionArgs) {
  await queryClient.ensureQueryData(projectQuery(params.projectId ?? ''));
  return null;
}

export function Component() {
  const { projectId = '' } = useParams();
  return <ProjectPage key={projectId} projectId={projectId} />;
}

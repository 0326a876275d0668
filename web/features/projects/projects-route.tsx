import { queryClient } from '../../lib/client';
import { projectsQuery } from '../../lib/queries/projects-query';
import { ProjectsPage } from './components/projects-page';

export async function loader() {
  await queryClient.ensureQueryData(projectsQuery());
  return null;
}

export function Component() {
  return <ProjectsPage />;
}

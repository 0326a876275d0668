import { useSearchParams } from 'react-router-dom';
import { queryClient } from '../../lib/client';
import { laboratoriesQuery } from '../../lib/queries/laboratories-query';
import { projectsQuery } from '../../lib/queries/projects-query';
import { UploadPage } from './components/upload-page';

export async function loader() {
  await Promise.all([
    queryClient.ensureQueryData(projectsQuery()),
    queryClient.ensureQueryData(laboratoriesQuery()),
  ]);
  return null;
}

export function Component() {
  const [search] = useSearchParams();
  return <UploadPage projectId={search.get('project')} />;
}

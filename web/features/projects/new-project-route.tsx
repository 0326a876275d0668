import { queryClient } from '../../lib/client';
import { contractorsQuery } from '../../lib/queries/contractors-query';
import { NewProjectPage } from './components/change-project-pages';

export async function loader() {
  await queryClient.ensureQueryData(contractorsQuery());
  return null;
}

export function Component() {
  return <NewProjectPage />;
}

import { queryClient } from '../../lib/client';
import { laboratoriesQuery } from '../../lib/queries/laboratories-query';
import { LaboratoriesPage } from './components/laboratories-page';

export async function loader() {
  await queryClient.ensureQueryData(laboratoriesQuery());
  return null;
}

export function Component() {
  return <LaboratoriesPage />;
}

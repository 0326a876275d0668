import { queryClient } from '../../lib/client';
import { laboratoriesQuery } from '../../lib/queries/laboratories-query';
import { mappingsQuery } from './api/mappings';
import { MappingsPage } from './components/mappings-page';

export async function loader() {
  await Promise.all([
    queryClient.ensureQueryData(mappingsQuery()),
    queryClient.ensureQueryData(laboratoriesQuery()),
  ]);
  return null;
}

export function Component() {
  return <MappingsPage />;
}

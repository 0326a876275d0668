import { queryClient } from '../../lib/client';
import { organisationQuery } from './api/organisation';
import { SettingsPage } from './components/settings-page';

export async function loader() {
  await queryClient.ensureQueryData(organisationQuery());
  return null;
}

export function Component() {
  return <SettingsPage />;
}

import { queryClient } from '../../lib/client';
import { contractorsQuery } from '../../lib/queries/contractors-query';
import { sessionQuery } from '../../lib/queries/session-query';
import { peopleQuery } from './api/people';
import { PeoplePage } from './components/people-page';

export async function loader() {
  const { active } = await queryClient.ensureQueryData(sessionQuery());
  await Promise.all([
    queryClient.ensureQueryData(peopleQuery()),
    ...(active?.kind === 'agency' ? [queryClient.ensureQueryData(contractorsQuery())] : []),
  ]);
  return null;
}

export function Component() {
  return <PeoplePage />;
}

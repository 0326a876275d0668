import { queryClient } from '../../lib/client';
import { ruleSetsQuery } from '../../lib/queries/rule-sets-query';
import { startingPointsQuery } from './api/start-draft';

export { NewDraftPage as Component } from './components/new-draft-page';

export async function loader() {
  await Promise.all([
    queryClient.ensureQueryData(ruleSetsQuery()),
    queryClient.ensureQueryData(startingPointsQuery()),
  ]);
  return null;
}

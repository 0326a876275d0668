import { queryClient } from '../../lib/client';
import { ruleSetsQuery } from '../../lib/queries/rule-sets-query';

export { ComparePage as Component } from './components/compare-page';

export async function loader() {
  await queryClient.ensureQueryData(ruleSetsQuery());
  return null;
}

import { queryClient } from '../../lib/client';
import { ruleSetsQuery } from '../../lib/queries/rule-sets-query';

export { RuleSetsPage as Component } from './components/rule-sets-page';

export async function loader() {
  await queryClient.ensureQueryData(ruleSetsQuery());
  return null;
}

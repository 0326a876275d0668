import { queryClient } from '../../lib/client';
import { ruleSetsQuery } from './api/get-rule-sets';

export { RuleSetsPage as Component } from './components/rule-sets-page';

export async function loader() {
  await queryClient.ensureQueryData(ruleSetsQuery());
  return null;
}

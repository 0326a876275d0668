import { queryOptions } from '@tanstack/react-query';
import { listRuleSets } from '#shared/contracts/rule-sets';
import { call } from '../api';

export function ruleSetsQuery() {
  return queryOptions({
    queryKey: ['rule-sets'],
    queryFn: ({ signal }) => call(listRuleSets, { signal }),
  });
}

import { queryOptions } from '@tanstack/react-query';
import { getRuleSet } from '#shared/contracts/rule-sets';
import { call } from '../../../lib/api';

export interface RuleSetParams {
  ruleSetId: string;
  edition: string;
  /** `cvra-s-07@2026,…` in order. */
  layers: string;
}

export function ruleSetQuery({ ruleSetId, edition, layers }: RuleSetParams) {
  return queryOptions({
    queryKey: ['rule-sets', ruleSetId, edition, layers],
    queryFn: ({ signal }) =>
      call(getRuleSet, {
        params: { ruleSetId, edition },
        query: layers === '' ? {} : { layers },
        signal,
      }),
  });
}

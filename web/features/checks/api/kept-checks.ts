import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getKeptCheck, listChecks } from '#shared/contracts/checks';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function checksQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'checks'],
    queryFn: ({ signal }) => call(listChecks, { params, signal }),
  });
}

export function keptCheckQuery(params: RevisionParams, check: number) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'checks', check],
    queryFn: ({ signal }) => call(getKeptCheck, { params: { ...params, check }, signal }),
  });
}

export function useChecks(params: RevisionParams) {
  return useSuspenseQuery(checksQuery(params)).data.checks;
}

export function useKeptCheck(params: RevisionParams, check: number) {
  return useSuspenseQuery(keptCheckQuery(params, check)).data;
}

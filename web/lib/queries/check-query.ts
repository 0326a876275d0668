import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { type CheckView, getCheck } from '#shared/contracts/checks';
import { call } from '../api';
import { type RevisionParams, revisionKey } from './revision-query';

export function checkQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'check'],
    queryFn: ({ signal }) => call(getCheck, { params, signal }),
  });
}

export function useCheck(params: RevisionParams): CheckView {
  return useSuspenseQuery(checkQuery(params)).data;
}

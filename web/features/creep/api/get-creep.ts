import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { type CreepView, getCreep } from '#shared/contracts/creep';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function creepQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'creep'],
    queryFn: ({ signal }) => call(getCreep, { params, signal }),
  });
}

export function useCreep(params: RevisionParams): CreepView {
  return useSuspenseQuery(creepQuery(params)).data;
}

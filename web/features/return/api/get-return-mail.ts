import { queryOptions, useQuery } from '@tanstack/react-query';
import { getReturnMail } from '#shared/contracts/returns';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function returnMailQuery(params: RevisionParams, version: number) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'return mail', version],
    queryFn: ({ signal }) => call(getReturnMail, { params, signal }),
  });
}

export function useReturnMail(params: RevisionParams, version: number) {
  return useQuery(returnMailQuery(params, version));
}

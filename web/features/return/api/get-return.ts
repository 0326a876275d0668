import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getReturn, type ReturnView } from '#shared/contracts/returns';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

const mailPollMilliseconds = 2_000;

/** While a mail waits to be sent its state is asked for again. */
export function returnQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'return'],
    queryFn: ({ signal }) => call(getReturn, { params, signal }),
    refetchInterval: (query) =>
      query.state.data?.sent?.mail.some((mail) => mail.state === 'waiting') ? mailPollMilliseconds : false,
  });
}

export function useReturn(params: RevisionParams): ReturnView {
  return useSuspenseQuery(returnQuery(params)).data;
}

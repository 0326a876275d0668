import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getReading, type ReadingView } from '#shared/contracts/readings';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function readingQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'reading'],
    queryFn: ({ signal }) => call(getReading, { params, signal }),
  });
}

export function useReading(params: RevisionParams): ReadingView {
  return useSuspenseQuery(readingQuery(params)).data;
}

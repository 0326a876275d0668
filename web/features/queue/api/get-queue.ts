import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getQueue } from '#shared/contracts/queue';
import { call } from '../../../lib/api';

export interface QueueFilters {
  who: 'everyone' | 'mine' | 'not taken' | 'to sign';
  by: 'due' | 'project';
}

export function queueQuery(filters: QueueFilters) {
  return queryOptions({
    queryKey: ['queue', 'list', filters],
    queryFn: ({ signal }) => call(getQueue, { query: filters, signal }),
  });
}

export function useQueue(filters: QueueFilters) {
  return useSuspenseQuery(queueQuery(filters)).data;
}

import { queryOptions, useQuery } from '@tanstack/react-query';
import { getQueueItem } from '#shared/contracts/queue';
import { call } from '../../../lib/api';

export function queueItemQuery(submittalId: string) {
  return queryOptions({
    queryKey: ['queue', 'item', submittalId],
    queryFn: ({ signal }) => call(getQueueItem, { params: { submittalId }, signal }),
  });
}

/** Without suspense: the queue itself stays while the panel beside it loads. */
export function useQueueItem(submittalId: string) {
  return useQuery(queueItemQuery(submittalId));
}

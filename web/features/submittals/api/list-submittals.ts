import { infiniteQueryOptions, useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { listSubmittals, type RevisionState } from '#shared/contracts/submittals';
import { call } from '../../../lib/api';

export interface SubmittalFilters {
  state?: RevisionState;
  project?: string;
  q?: string;
}

export function submittalsQuery(filters: SubmittalFilters) {
  return infiniteQueryOptions({
    queryKey: ['submittals', 'list', filters],
    queryFn: ({ pageParam, signal }) =>
      call(listSubmittals, { query: { ...filters, ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
    initialPageParam: '',
    getNextPageParam: (page) => page.nextCursor,
  });
}

export function useSubmittals(filters: SubmittalFilters) {
  const query = useSuspenseInfiniteQuery(submittalsQuery(filters));
  return {
    items: query.data.pages.flatMap((page) => page.items),
    hasMore: query.hasNextPage,
    isLoadingMore: query.isFetchingNextPage,
    showMore: () => query.fetchNextPage(),
  };
}

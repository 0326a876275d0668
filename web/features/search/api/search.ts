import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { search } from '#shared/contracts/search';
import { call } from '../../../lib/api';

export function searchQuery(text: string) {
  const q = text.trim();
  return queryOptions({
    queryKey: ['search', q],
    queryFn: ({ signal }) => call(search, { query: { q }, signal }),
    enabled: q.length > 0,
    placeholderData: keepPreviousData,
  });
}

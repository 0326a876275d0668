import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getHome, type Home } from '#shared/contracts/home';
import { call } from '../../../lib/api';

export function homeQuery() {
  return queryOptions({
    queryKey: ['home'],
    queryFn: ({ signal }) => call(getHome, { signal }),
  });
}

export function useHome(): Home {
  return useSuspenseQuery(homeQuery()).data;
}

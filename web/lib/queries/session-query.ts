import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getSession, type Session } from '#shared/contracts/session';
import { call } from '../api';

export function sessionQuery() {
  return queryOptions({
    queryKey: ['session'],
    queryFn: ({ signal }) => call(getSession, { signal }),
    staleTime: 60_000,
  });
}

export function useSession(): Session {
  return useSuspenseQuery(sessionQuery()).data;
}

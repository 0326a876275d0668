import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getSignInOptions } from '#shared/contracts/session';
import { call } from '../../../lib/api';

export function signInOptionsQuery() {
  return queryOptions({
    queryKey: ['sign-in options'],
    queryFn: ({ signal }) => call(getSignInOptions, { signal }),
  });
}

export function useSignInOptions() {
  return useSuspenseQuery(signInOptionsQuery()).data;
}

import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { getSetUp, setUp } from '#shared/contracts/session';
import { call } from '../../../lib/api';
import { useBeginSession } from '../../../lib/queries/use-begin-session';

export type SetUpFields = z.input<NonNullable<typeof setUp.body>>;

export function setUpQuery(token: string) {
  return queryOptions({
    queryKey: ['set-up', token],
    queryFn: ({ signal }) => call(getSetUp, { params: { token }, signal }),
  });
}

export function useSetUpLink(token: string) {
  return useSuspenseQuery(setUpQuery(token)).data;
}

export function useSetUp(token: string) {
  const begin = useBeginSession();
  return async (fields: SetUpFields) => begin(await call(setUp, { params: { token }, body: fields }));
}

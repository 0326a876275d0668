import { queryOptions, useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { getCaughtMail, listCaughtMail } from '#shared/contracts/caught-mail';
import { call } from '../../../lib/api';

const pollMilliseconds = 4_000;

/** Mail arrives on its own, so the list asks again while it is looked at. */
export function caughtMailsQuery() {
  return queryOptions({
    queryKey: ['caught mail', 'list'],
    queryFn: ({ signal }) => call(listCaughtMail, { signal }),
    refetchInterval: pollMilliseconds,
  });
}

export function useCaughtMails() {
  return useSuspenseQuery(caughtMailsQuery()).data.mails;
}

export function caughtMailQuery(mailId: string) {
  return queryOptions({
    queryKey: ['caught mail', mailId],
    queryFn: ({ signal }) => call(getCaughtMail, { params: { mailId }, signal }),
  });
}

export function useCaughtMail(mailId: string) {
  return useQuery(caughtMailQuery(mailId));
}

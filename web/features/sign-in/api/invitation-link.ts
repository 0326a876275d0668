import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { acceptInvitation, getInvitation } from '#shared/contracts/people';
import { call } from '../../../lib/api';
import { useBeginSession } from '../../../lib/queries/use-begin-session';

export function invitationLinkQuery(token: string) {
  return queryOptions({
    queryKey: ['invitation links', token],
    queryFn: ({ signal }) => call(getInvitation, { params: { token }, signal }),
  });
}

export function useInvitationLink(token: string) {
  return useSuspenseQuery(invitationLinkQuery(token)).data;
}

export function useAcceptInvitation(token: string) {
  const begin = useBeginSession();
  return async (given: { name: string; password: string }) =>
    begin(await call(acceptInvitation, { params: { token }, body: given }));
}

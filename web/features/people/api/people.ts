import { queryOptions, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import {
  changePerson,
  type Invitation,
  invitePerson,
  listPeople,
  type Person,
  removePerson,
  withdrawInvitation,
} from '#shared/contracts/people';
import type { Role } from '#shared/contracts/roles';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';

export type InvitationFields = z.input<NonNullable<typeof invitePerson.body>>;

export function peopleQuery() {
  return queryOptions({
    queryKey: ['people'],
    queryFn: ({ signal }) => call(listPeople, { signal }),
    // An invitation's mail is sent in the background.
    refetchInterval: (query) =>
      query.state.data?.invitations.some((invitation) => invitation.mail === 'waiting') ? 2_000 : false,
  });
}

export function usePeople() {
  return useSuspenseQuery(peopleQuery()).data;
}

/** What an administrator does with people; each act renews the list. */
export function usePeopleActs() {
  const client = useQueryClient();
  const act = useActKey();
  const renew = () => client.invalidateQueries({ queryKey: peopleQuery().queryKey });
  return {
    invite: async (fields: InvitationFields) => {
      const invitation = await call(invitePerson, { body: fields, idempotencyKey: act.keyFor(fields) });
      act.done();
      await renew();
      return invitation;
    },
    changeRoles: async ({ membershipId, version }: Person, roles: Role[]) => {
      await call(changePerson, { params: { membershipId }, body: { roles }, version });
      await renew();
    },
    remove: async ({ membershipId, version }: Person) => {
      await call(removePerson, { params: { membershipId }, version });
      await renew();
    },
    withdraw: async ({ id: invitationId, version }: Invitation) => {
      await call(withdrawInvitation, { params: { invitationId }, version });
      await renew();
    },
  };
}

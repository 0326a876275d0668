import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getRoom, type RoomView } from '#shared/contracts/room';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function roomQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'room'],
    queryFn: ({ signal }) => call(getRoom, { params, signal }),
  });
}

export function useRoom(params: RevisionParams): RoomView {
  return useSuspenseQuery(roomQuery(params)).data;
}

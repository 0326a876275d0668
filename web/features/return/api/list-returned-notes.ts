import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { listReturnedNotes } from '#shared/contracts/returns';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function returnedNotesQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'returned notes'],
    queryFn: ({ signal }) => call(listReturnedNotes, { params, signal }),
  });
}

export function useReturnedNotes(params: RevisionParams) {
  return useSuspenseQuery(returnedNotesQuery(params)).data;
}

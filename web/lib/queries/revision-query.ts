import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { getRevision, type Revision } from '#shared/contracts/submittals';
import { call } from '../api';

export interface RevisionParams {
  submittalId: string;
  number: number;
}

/** Everything that hangs on one revision; invalidating it renews all of it. */
export function revisionKey({ submittalId, number }: RevisionParams) {
  return ['submittals', submittalId, 'revisions', number] as const;
}

export function revisionQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'revision'],
    queryFn: ({ signal }) => call(getRevision, { params, signal }),
  });
}

export function useRevision(params: RevisionParams): Revision {
  return useSuspenseQuery(revisionQuery(params)).data;
}

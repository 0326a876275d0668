import { queryOptions, useQuery } from '@tanstack/react-query';
import { getLetter } from '#shared/contracts/returns';
import { hrefOf } from '../../../lib/api';
import { problemFromNetwork, problemFromResponse } from '../../../lib/problem';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

/** The bytes of the letter: the draft's preview by version, or the stored letter. */
export function letterQuery(params: RevisionParams, version: number) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'letter', version],
    queryFn: ({ signal }) => fetchLetter(letterHref(params), signal),
    staleTime: 5_000,
    gcTime: 60_000,
  });
}

export function useLetter(params: RevisionParams, version: number) {
  return useQuery({ ...letterQuery(params, version), placeholderData: (previous) => previous });
}

export function letterHref(params: RevisionParams): string {
  return hrefOf(getLetter, { params });
}

async function fetchLetter(href: string, signal: AbortSignal): Promise<ArrayBuffer> {
  const response = await fetch(href, { credentials: 'same-origin', signal }).catch((error) => {
    if (signal.aborted) throw error;
    throw problemFromNetwork();
  });
  if (!response.ok) throw await problemFromResponse(response);
  return response.arrayBuffer();
}

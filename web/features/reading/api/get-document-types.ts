import { queryOptions, useQuery } from '@tanstack/react-query';
import { getDocumentTypes } from '#shared/contracts/readings';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function documentTypesQuery(params: RevisionParams) {
  return queryOptions({
    queryKey: [...revisionKey(params), 'document types'],
    queryFn: ({ signal }) => call(getDocumentTypes, { params, signal }),
    staleTime: 300_000,
  });
}

export function useDocumentTypes(params: RevisionParams) {
  return useQuery(documentTypesQuery(params));
}

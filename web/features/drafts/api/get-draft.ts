import { queryOptions } from '@tanstack/react-query';
import { getDraft, listDraftComments } from '#shared/contracts/drafts';
import { call } from '../../../lib/api';

/** Another author’s changes are seen within this time. */
const refreshSeconds = 15;

export function draftQuery(draftId: string) {
  return queryOptions({
    queryKey: ['drafts', draftId],
    queryFn: ({ signal }) => call(getDraft, { params: { draftId }, signal }),
    refetchInterval: refreshSeconds * 1000,
  });
}

export function draftCommentsQuery(draftId: string) {
  return queryOptions({
    queryKey: ['drafts', draftId, 'comments'],
    queryFn: ({ signal }) => call(listDraftComments, { params: { draftId }, signal }),
    refetchInterval: refreshSeconds * 1000,
  });
}

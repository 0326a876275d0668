import { useMutation, useQueryClient } from '@tanstack/react-query';
import { type DraftComment, removeDraftComment, writeDraftComment } from '#shared/contracts/drafts';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { draftCommentsQuery } from './get-draft';

export function useWriteComment(draftId: string) {
  const client = useQueryClient();
  const act = useActKey();
  return useMutation({
    mutationFn: (body: { rule: string | null; text: string }) =>
      call(writeDraftComment, { params: { draftId }, body, idempotencyKey: act.keyFor(body) }),
    onSuccess: () => {
      act.done();
      return client.invalidateQueries({ queryKey: draftCommentsQuery(draftId).queryKey });
    },
  });
}

export function useRemoveComment(draftId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, version }: Pick<DraftComment, 'id' | 'version'>) =>
      call(removeDraftComment, { params: { draftId, commentId: id }, version }),
    onSettled: () => client.invalidateQueries({ queryKey: draftCommentsQuery(draftId).queryKey }),
  });
}

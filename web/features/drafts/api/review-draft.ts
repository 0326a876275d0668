import { useMutation, useQueryClient } from '@tanstack/react-query';
import {
  type Draft,
  discardDraft,
  publishDraft,
  sendDraftForReview,
  takeDraftBack,
  verifyRules,
} from '#shared/contracts/drafts';
import { call } from '../../../lib/api';
import { ruleSetsQuery } from '../../../lib/queries/rule-sets-query';
import { draftQuery } from './get-draft';

type Seen = Pick<Draft, 'id' | 'version'>;

/** Each act shows the draft as it is afterwards; a refusal renews it, since somebody else was most often faster. */
function useDraftAct<Input extends Seen, Result>(run: (input: Input) => Promise<Result>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: run,
    onSettled: (_, __, { id }) =>
      Promise.all([
        client.invalidateQueries({ queryKey: draftQuery(id).queryKey, exact: true }),
        client.invalidateQueries({ queryKey: ruleSetsQuery().queryKey }),
      ]),
  });
}

export const useSendForReview = () =>
  useDraftAct(({ id, version }: Seen) => call(sendDraftForReview, { params: { draftId: id }, version }));

export const useTakeBack = () =>
  useDraftAct(({ id, version }: Seen) => call(takeDraftBack, { params: { draftId: id }, version }));

export const useVerifyRules = () =>
  useDraftAct(({ id, version, rules }: Seen & { rules: string[] }) =>
    call(verifyRules, { params: { draftId: id }, body: { rules }, version }),
  );

/** Afterwards the draft is gone, so it is not asked for again. */
export function usePublish() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, version, word }: Seen & { word: string | null }) =>
      call(publishDraft, { params: { draftId: id }, body: { word }, version }),
    onSuccess: () => client.invalidateQueries({ queryKey: ruleSetsQuery().queryKey }),
  });
}

export function useDiscard() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, version }: Seen) => call(discardDraft, { params: { draftId: id }, version }),
    onSuccess: () => client.invalidateQueries({ queryKey: ruleSetsQuery().queryKey }),
  });
}

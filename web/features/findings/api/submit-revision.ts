import { useMutation, useQueryClient } from '@tanstack/react-query';
import { submitRevision, withdrawRevision } from '#shared/contracts/submittals';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function useSubmitRevision(params: RevisionParams, version: number) {
  const client = useQueryClient();
  const act = useActKey();
  return useMutation({
    mutationFn: (body: { declaration: string; accepted: true; seal: string }) =>
      call(submitRevision, { params, body, version, idempotencyKey: act.keyFor(body) }),
    onSuccess: () => {
      act.done();
      return Promise.all([
        client.invalidateQueries({ queryKey: revisionKey(params) }),
        client.invalidateQueries({ queryKey: ['home'] }),
      ]);
    },
  });
}

export function useWithdrawRevision(params: RevisionParams, version: number) {
  const client = useQueryClient();
  const act = useActKey();
  return useMutation({
    mutationFn: (body: { reason: string }) =>
      call(withdrawRevision, { params, body, version, idempotencyKey: act.keyFor(body) }),
    onSuccess: () => {
      act.done();
      return client.invalidateQueries({ queryKey: revisionKey(params) });
    },
  });
}

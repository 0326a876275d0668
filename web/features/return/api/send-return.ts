import { useMutation, useQueryClient } from '@tanstack/react-query';
import { makeReturnReady, sendReturn } from '#shared/contracts/returns';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { returnQuery } from './get-return';

export function useSendReturn(params: RevisionParams) {
  const settle = useReturnSettled(params);
  const act = useActKey();
  return useMutation({
    mutationFn: ({ version }: { version: number }) =>
      call(sendReturn, { params, body: {}, version, idempotencyKey: act.keyFor(version) }),
    onSettled: settle,
  });
}

export function useMakeReturnReady(params: RevisionParams) {
  const settle = useReturnSettled(params);
  const act = useActKey();
  return useMutation({
    mutationFn: ({ version, signingEngineerId }: { version: number; signingEngineerId: string }) =>
      call(makeReturnReady, {
        params,
        body: { signingEngineerId },
        version,
        idempotencyKey: act.keyFor([version, signingEngineerId]),
      }),
    onSettled: settle,
  });
}

/** The decision shows in the queue, in every list and on the revision itself. */
function useReturnSettled(params: RevisionParams) {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: returnQuery(params).queryKey }),
      client.invalidateQueries({ queryKey: ['submittals'] }),
      client.invalidateQueries({ queryKey: ['queue'] }),
    ]);
}

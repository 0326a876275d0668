import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { removeWaiver, type Waiver, waive } from '#shared/contracts/notes';
import { useActKey } from '../../../lib/act-key';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export type WaiverInput = z.input<NonNullable<typeof waive.body>>;

export function useWaive(params: RevisionParams) {
  const client = useQueryClient();
  const act = useActKey();
  return useMutation({
    mutationFn: (body: WaiverInput) => call(waive, { params, body, idempotencyKey: act.keyFor(body) }),
    onSuccess: () => {
      act.done();
      return client.invalidateQueries({ queryKey: revisionKey(params) });
    },
  });
}

export function useRemoveWaiver(params: RevisionParams) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (waiver: Waiver) =>
      call(removeWaiver, { params: { waiverId: waiver.id }, version: waiver.version }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueueItem } from '#shared/contracts/queue';
import { giveBackRevision, takeRevision } from '#shared/contracts/submittals';
import { call } from '../../../lib/api';

type Row = Pick<QueueItem, 'submittalId' | 'revision' | 'version'>;

export function useTakeRevision() {
  return useReviewerChange(({ submittalId, revision, version }: Row) =>
    call(takeRevision, { params: { submittalId, number: revision }, body: {}, version }),
  );
}

export function useGiveBackRevision() {
  return useReviewerChange(({ submittalId, revision, version }: Row) =>
    call(giveBackRevision, { params: { submittalId, number: revision }, version }),
  );
}

/** A refusal also renews the queue: most often somebody else was faster. */
function useReviewerChange(change: (row: Row) => Promise<unknown>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: ['queue'] }),
        client.invalidateQueries({ queryKey: ['submittals'] }),
      ]),
  });
}

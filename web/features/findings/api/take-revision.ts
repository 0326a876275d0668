import { useMutation, useQueryClient } from '@tanstack/react-query';
import { giveBackRevision, takeRevision } from '#shared/contracts/submittals';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function useTakeRevision(params: RevisionParams, version: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(takeRevision, { params, body: {}, version }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

export function useGiveBackRevision(params: RevisionParams, version: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(giveBackRevision, { params, version }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

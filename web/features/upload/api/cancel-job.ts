import { useMutation, useQueryClient } from '@tanstack/react-query';
import { cancelJob, type Job } from '#shared/contracts/submittals';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function useCancelJob(params: RevisionParams) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, version }: Job) => call(cancelJob, { params: { jobId: id }, version }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

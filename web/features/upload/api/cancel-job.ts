import { useMutation, useQueryClient } from '@tanstack/react-query';
import { cancelJob } from '#shared/contracts/submittals';
import { call } from '../../../lib/api';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function useCancelJob(params: RevisionParams) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (jobId: string) => call(cancelJob, { params: { jobId } }),
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

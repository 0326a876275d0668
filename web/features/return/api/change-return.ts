import { useMutation, useQueryClient } from '@tanstack/react-query';
import { changeReturn, type ReturnFields } from '#shared/contracts/returns';
import { call } from '../../../lib/api';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { returnQuery } from './get-return';

export function useChangeReturn(params: RevisionParams) {
  const client = useQueryClient();
  const options = returnQuery(params);
  return useMutation({
    mutationFn: async (fields: ReturnFields) => {
      const { version } = await client.ensureQueryData(options);
      return call(changeReturn, { params, body: fields, version });
    },
    // A view that was asked for before this change would put the old version back.
    onMutate: () => client.cancelQueries({ queryKey: options.queryKey }),
    onSuccess: (view) => client.setQueryData(options.queryKey, view),
  });
}

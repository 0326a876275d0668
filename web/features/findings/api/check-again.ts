import { useMutation, useQueryClient } from '@tanstack/react-query';
import { checkAgain } from '#shared/contracts/checks';
import { announce } from '../../../lib/announce';
import { call } from '../../../lib/api';
import { changedOutcomes } from '../../../lib/changed-outcomes';
import { checkQuery } from '../../../lib/queries/check-query';
import { type RevisionParams, revisionKey } from '../../../lib/queries/revision-query';

export function useCheckAgain(params: RevisionParams, version: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(checkAgain, { params, body: {}, version }),
    onSuccess: (check) => {
      const before = client.getQueryData(checkQuery(params).queryKey);
      announce(changedOutcomes(before?.findings ?? [], check.findings));
      client.setQueryData(checkQuery(params).queryKey, check);
    },
    // After a refusal too: what has changed in the meantime is to be seen before it is checked again.
    onSettled: () => client.invalidateQueries({ queryKey: revisionKey(params) }),
  });
}

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { withdrawEdition } from '#shared/contracts/drafts';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { TextAreaField } from '../../../components/ui/text-field';
import { useActKey } from '../../../lib/act-key';
import { announce } from '../../../lib/announce';
import { call } from '../../../lib/api';
import { asProblem } from '../../../lib/problem';

/** Withdrawn with a reason: sections and checks that name the edition keep it, and no project may take it any more. */
export function WithdrawEdition({ ruleSetId, edition }: { ruleSetId: string; edition: string }) {
  const [reason, setReason] = useState<string | null>(null);
  const withdraw = useWithdraw(ruleSetId, edition);
  if (reason === null) {
    return (
      <Button kind="inline" onPress={() => setReason('')}>
        Withdraw the edition
      </Button>
    );
  }
  return (
    <div className="pt-2">
      {withdraw.error ? <ProblemNotice problem={asProblem(withdraw.error)} /> : null}
      <TextAreaField
        label="Why it is withdrawn"
        rows={2}
        maxLength={limits.reasonCharacters}
        value={reason}
        onChange={setReason}
        autoFocus
      />
      <div className="acts pt-2">
        <Button
          isDisabled={reason.trim() === ''}
          isPending={withdraw.isPending}
          onPress={() =>
            withdraw.mutate(reason, { onSuccess: () => announce(`Edition ${edition} is withdrawn.`) })
          }
        >
          Withdraw it
        </Button>
        <Button kind="text" onPress={() => setReason(null)}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

function useWithdraw(ruleSetId: string, edition: string) {
  const client = useQueryClient();
  const act = useActKey();
  return useMutation({
    mutationFn: (reason: string) =>
      call(withdrawEdition, {
        params: { ruleSetId, edition },
        body: { reason },
        idempotencyKey: act.keyFor({ ruleSetId, edition, reason }),
      }),
    onSuccess: () => {
      act.done();
      return client.invalidateQueries({ queryKey: ['rule-sets'] });
    },
  });
}

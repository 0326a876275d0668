import { useState } from 'react';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { TextAreaField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { asProblem } from '../../../lib/problem';
import { useWithdrawRevision } from '../api/submit-revision';
import { useLedger } from './ledger-context';

/** Takes a revision out of the agency's hands, with the reason that its reviewer will read. */
export function WithdrawForm({ onLeave }: { onLeave: () => void }) {
  const { params, revision } = useLedger();
  const [reason, setReason] = useState('');
  const [missing, setMissing] = useState(false);
  const withdraw = useWithdrawRevision(params, revision.version);
  const send = () => {
    if (reason.trim() === '') {
      setMissing(true);
      return;
    }
    withdraw.mutate({ reason }, { onSuccess: () => announce(`Revision ${revision.number} is withdrawn.`) });
  };
  return (
    <div className="note-form">
      <TextAreaField
        label="Why it is withdrawn"
        hideLabel
        autoFocus
        rows={2}
        maxLength={limits.reasonCharacters}
        placeholder="Why it is withdrawn"
        value={reason}
        onChange={(next) => {
          setReason(next);
          setMissing(false);
        }}
        error={missing ? 'Say why.' : undefined}
      />
      {withdraw.isError ? (
        <ProblemNotice problem={asProblem(withdraw.error)} unaffected="The revision is still submitted." />
      ) : null}
      <div className="acts">
        <Button isDisabled={withdraw.isPending} onPress={send}>
          Withdraw revision {revision.number}
        </Button>
        <Button kind="text" onPress={onLeave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

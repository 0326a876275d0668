import { useState } from 'react';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { Checkbox } from '../../../components/ui/checkbox';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { TextAreaField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { asProblem } from '../../../lib/problem';
import { useWaive } from '../api/waive';
import { returnToRow } from '../hooks/use-address-row';
import type { LedgerRow } from '../lib/ledger';
import { nameOfFinding } from '../lib/row-words';
import { useLedger } from './ledger-context';

/** A reasoned acceptance of a fail. The outcome stays fail; the mark says that it was let stand. */
export function WaiveForm({ row }: { row: LedgerRow }) {
  const { params, setDraft } = useLedger();
  const [reason, setReason] = useState('');
  const [toBeReturned, setToBeReturned] = useState(true);
  const [missing, setMissing] = useState(false);
  const waive = useWaive(params);
  const name = nameOfFinding(row.finding);
  const leave = () => {
    setDraft(null);
    returnToRow(row.key);
  };
  const keep = () => {
    if (reason.trim() === '') {
      setMissing(true);
      return;
    }
    waive.mutate(
      { finding: row.key, reason, toBeReturned },
      {
        onSuccess: () => {
          announce(`${name} is waived. It stays fail.`);
          leave();
        },
      },
    );
  };
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: the keys belong to the fields inside.
    <div
      className="note-form"
      onKeyDown={(event) => {
        if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) keep();
        if (event.key === 'Escape') leave();
      }}
    >
      <TextAreaField
        label={`Reason for waiving ${name}`}
        hideLabel
        autoFocus
        rows={3}
        maxLength={limits.reasonCharacters}
        placeholder={`Reason for waiving ${name}`}
        value={reason}
        onChange={(next) => {
          setReason(next);
          setMissing(false);
        }}
        error={missing ? 'Give the reason.' : undefined}
      />
      <Checkbox isSelected={toBeReturned} onChange={setToBeReturned}>
        return the reason to the contractor
      </Checkbox>
      {waive.isError ? (
        <ProblemNotice problem={asProblem(waive.error)} unaffected="The reason is kept here." />
      ) : null}
      <div className="acts">
        <Button onPress={keep} isDisabled={waive.isPending} keyHint="Ctrl Enter">
          Waive {name}
        </Button>
        <Button kind="text" onPress={leave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}

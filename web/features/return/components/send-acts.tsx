import { useState } from 'react';
import type { ReturnView } from '#shared/contracts/returns';
import { Button } from '../../../components/ui/button';
import { SelectField } from '../../../components/ui/select-field';
import { onlyOne } from '../../../lib/only-one';

/** A signing engineer signs and sends; a reviewer hands the return on. */
export function SendActs({
  view,
  isActing,
  onSend,
  onSendToSign,
}: {
  view: ReturnView;
  isActing: boolean;
  onSend: () => void;
  onSendToSign: (signingEngineerId: string) => void;
}) {
  const { signingEngineers, abilities, internalNotes } = view;
  const sole = onlyOne(signingEngineers);
  const [chosen, setChosen] = useState<string | null>(sole?.id ?? null);
  const engineer = signingEngineers.find(({ id }) => id === chosen) ?? null;
  return (
    <div className="send-acts">
      {view.state === 'ready to sign' ? (
        <p className="send-state">
          <b>Ready to sign.</b> {view.preparedBy ? `Prepared by ${view.preparedBy.name}.` : null}
        </p>
      ) : null}
      {abilities.send ? (
        <Button kind="primary" keyHint="Ctrl Enter" onPress={onSend} isPending={isActing}>
          Sign and send
        </Button>
      ) : null}
      {abilities.makeReady && signingEngineers.length > 1 ? (
        <SelectField
          label="Signing engineer"
          hideLabel
          placeholder="signing engineer"
          choices={signingEngineers.map(({ id, name }) => ({ value: id, label: name }))}
          value={chosen}
          onChange={setChosen}
        />
      ) : null}
      {abilities.makeReady && signingEngineers.length > 0 ? (
        <Button
          kind={abilities.send ? 'outlined' : 'primary'}
          isDisabled={engineer === null}
          isPending={isActing}
          onPress={() => engineer && onSendToSign(engineer.id)}
        >
          {engineer ? `Send to ${engineer.name} to sign` : 'Send to a signing engineer'}
        </Button>
      ) : null}
      {abilities.makeReady && signingEngineers.length === 0 ? (
        <span className="small mute">
          Nobody in the agency is a signing engineer. An administrator gives the role under People.
        </span>
      ) : null}
      <span className="small mute">{internalWords(internalNotes)}</span>
    </div>
  );
}

function internalWords(count: number): string {
  if (count === 0) return '';
  return count === 1 ? '1 internal note stays here.' : `${count} internal notes stay here.`;
}

import type { ReturnView } from '#shared/contracts/returns';
import { countInFigures } from '#shared/format/numbers';
import { Button } from '../../../components/ui/button';
import { SelectField } from '../../../components/ui/select-field';
import type { SigningEngineer } from '../hooks/use-signing-engineer';

/** A signing engineer signs and sends; a reviewer hands the return on. */
export function SendActs({
  view,
  signing: { engineer, chosen, choose },
  isActing,
  onSend,
  onSendToSign,
}: {
  view: ReturnView;
  signing: SigningEngineer;
  isActing: boolean;
  onSend: () => void;
  onSendToSign: (signingEngineerId: string) => void;
}) {
  const { signingEngineers, abilities, internalNotes } = view;
  return (
    <div className="send-acts">
      {view.state === 'ready to sign' ? (
        <p className="send-state">
          <b>Ready to sign.</b> {view.preparedBy ? `Prepared by ${view.preparedBy.name}.` : null}
        </p>
      ) : null}
      {abilities.send ? (
        <Button
          kind="primary"
          className="acts-in-foot"
          keyHint="Ctrl Enter"
          onPress={onSend}
          isPending={isActing}
        >
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
          onChange={choose}
        />
      ) : null}
      {abilities.makeReady && signingEngineers.length > 0 ? (
        <Button
          kind={abilities.send ? 'outlined' : 'primary'}
          className="acts-in-foot"
          isDisabled={engineer === null}
          isPending={isActing}
          onPress={() => engineer && onSendToSign(engineer.id)}
        >
          {sendToSignWords(engineer)}
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

export function sendToSignWords(engineer: SigningEngineer['engineer']): string {
  return engineer ? `Send to ${engineer.name} to sign` : 'Send to a signing engineer';
}

function internalWords(count: number): string {
  if (count === 0) return '';
  return `${countInFigures(count, 'internal note stays', 'internal notes stay')} here.`;
}

import { useState } from 'react';
import type { Note, NoteKind } from '#shared/contracts/notes';
import { limits } from '#shared/limits';
import { Button } from '../../../components/ui/button';
import { ProblemNotice } from '../../../components/ui/problem-notice';
import { RadioLine } from '../../../components/ui/radio-line';
import { TextAreaField } from '../../../components/ui/text-field';
import { announce } from '../../../lib/announce';
import { asProblem } from '../../../lib/problem';
import { useSession } from '../../../lib/queries/session-query';
import { useChangeNote } from '../api/change-note';
import { useWriteNote } from '../api/write-note';
import { returnToRow } from '../hooks/use-address-row';
import { useLedger } from './ledger-context';

const kinds = {
  agency: [
    { value: 'to be returned', label: 'to be returned' },
    { value: 'internal', label: 'internal' },
  ],
  contractor: [
    { value: 'reply', label: 'reply to the agency' },
    { value: 'internal', label: 'internal' },
  ],
} as const satisfies Record<string, readonly { value: NoteKind; label: string }[]>;

/** Writes a note, answers one or changes one; Ctrl Enter keeps it, Escape leaves it. */
export function NoteForm({
  finding,
  about = 'the whole submittal',
  answers,
  change,
}: {
  /** `ruleId~subject`, or null for the whole submittal. */
  finding: string | null;
  about?: string;
  answers?: Note;
  change?: Note;
}) {
  const { params, setDraft } = useLedger();
  const side = useSession().active?.kind ?? 'contractor';
  const [text, setText] = useState(change?.text ?? '');
  const [kind, setKind] = useState<NoteKind>(change?.kind ?? kinds[side][0].value);
  const [missing, setMissing] = useState(false);
  const write = useWriteNote(params);
  const rewrite = useChangeNote(params);
  const problem = write.error ?? rewrite.error;
  const leave = () => {
    setDraft(null);
    returnToRow(finding);
  };
  const keep = () => {
    if (text.trim() === '') {
      setMissing(true);
      return;
    }
    const onSuccess = () => {
      announce('The note is kept.');
      leave();
    };
    if (change) rewrite.mutate({ note: change, kind, text }, { onSuccess });
    else write.mutate({ finding, kind, text, answers: answers?.id ?? null }, { onSuccess });
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
        label={answers ? `Answer to ${answers.by}` : `Note on ${about}`}
        hideLabel
        autoFocus
        rows={3}
        maxLength={limits.noteCharacters}
        placeholder={answers ? 'Your answer' : `On ${about}`}
        value={text}
        onChange={(next) => {
          setText(next);
          setMissing(false);
        }}
        error={missing ? 'Write the note first.' : undefined}
      />
      <RadioLine label="Who sees it" hideLabel choices={kinds[side]} value={kind} onChange={setKind} />
      {problem ? <ProblemNotice problem={asProblem(problem)} unaffected="The text is kept here." /> : null}
      <div className="acts">
        <Button onPress={keep} isDisabled={write.isPending || rewrite.isPending} keyHint="Ctrl Enter">
          Keep the note
        </Button>
        <Button kind="text" onPress={leave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}
